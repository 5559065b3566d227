import type { HeightMethod } from '@slighthill/shared/contracts/common';
import type { SafetyAnswer } from '@slighthill/shared/contracts/measurement';
import type { BronchodilatorState } from '@slighthill/shared/contracts/spirometry-test';
import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import type { ClinicalEntry, VoidReason } from './clinical-entry';
import * as column from './columns';

export type MeasurementSourceKind = 'spirometry-test' | 'measurement' | 'body-size' | 'derived';

/** One fact over time. `value` is in the storage unit of the measure's registry entry. */
export class Measurement
  extends Model<InferAttributes<Measurement>, InferCreationAttributes<Measurement>>
  implements ClinicalEntry
{
  declare id: string;
  declare clinicId: string;
  declare patientId: string;
  declare enrollmentId: string | null;
  declare measure: string;
  declare takenAt: Date;
  declare value: number;
  declare state: BronchodilatorState | null;
  declare conditions: Record<string, number | boolean | string>;
  declare quality: CreationOptional<string | null>;
  declare heightCm: number | null;
  declare heightMethod: HeightMethod | null;
  declare heightCarried: CreationOptional<boolean>;
  declare weightKg: number | null;
  declare safetyAnswer: CreationOptional<SafetyAnswer | null>;
  declare note: CreationOptional<string | null>;
  declare sourceKind: MeasurementSourceKind;
  declare sourceId: string;
  declare recordedBy: string;
  declare version: CreationOptional<number>;
  declare voidedAt: CreationOptional<Date | null>;
  declare voidedBy: CreationOptional<string | null>;
  declare voidReason: CreationOptional<VoidReason | null>;
  declare voidText: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initMeasurement(sequelize: Sequelize): void {
  Measurement.init(
    {
      id: column.id(),
      clinicId: column.uuid(),
      patientId: column.uuid(),
      enrollmentId: column.uuid(),
      measure: column.textColumn(),
      takenAt: column.instant(),
      value: column.float(),
      state: column.textColumn(),
      conditions: { ...column.json(), defaultValue: {} },
      quality: column.textColumn(),
      heightCm: column.decimal('heightCm', 4, 1),
      heightMethod: column.textColumn(),
      heightCarried: { ...column.flag(), defaultValue: false },
      weightKg: column.decimal('weightKg', 4, 1),
      safetyAnswer: column.textColumn(),
      note: column.textColumn(),
      sourceKind: column.textColumn(),
      sourceId: column.uuid(),
      ...column.entryColumns(),
    },
    { sequelize, tableName: 'measurements', modelName: 'Measurement' },
  );
}
