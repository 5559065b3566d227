import type { HeightMethod } from '@slighthill/shared/contracts/common';
import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import type { ClinicalEntry, VoidReason } from './clinical-entry';
import * as column from './columns';

export class BodySize
  extends Model<InferAttributes<BodySize>, InferCreationAttributes<BodySize>>
  implements ClinicalEntry
{
  declare id: string;
  declare clinicId: string;
  declare patientId: string;
  declare takenAt: Date;
  declare heightCm: number | null;
  declare heightMethod: HeightMethod | null;
  declare weightKg: number | null;
  declare note: CreationOptional<string | null>;
  declare sourceKind: 'body-size' | 'spirometry-test' | 'measurement';
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

export function initBodySize(sequelize: Sequelize): void {
  BodySize.init(
    {
      id: column.id(),
      clinicId: column.uuid(),
      patientId: column.uuid(),
      takenAt: column.instant(),
      heightCm: column.decimal('heightCm', 4, 1),
      heightMethod: column.textColumn(),
      weightKg: column.decimal('weightKg', 4, 1),
      note: column.textColumn(),
      sourceKind: column.textColumn(),
      sourceId: column.uuid(),
      ...column.entryColumns(),
    },
    { sequelize, tableName: 'body_sizes', modelName: 'BodySize' },
  );
}
