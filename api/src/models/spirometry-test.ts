import type { HeightMethod } from '@slighthill/shared/contracts/common';
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

export class SpirometryTest
  extends Model<InferAttributes<SpirometryTest>, InferCreationAttributes<SpirometryTest>>
  implements ClinicalEntry
{
  declare id: string;
  declare clinicId: string;
  declare patientId: string;
  declare visitId: string;
  declare performedAt: Date;
  declare heightCm: number;
  declare heightMethod: HeightMethod;
  declare weightKg: number | null;
  declare bronchodilator: BronchodilatorState;
  declare drug: string | null;
  declare doseMcg: number | null;
  declare minutesSinceDose: number | null;
  declare ownBronchodilatorHoursAgo: number | null;
  declare entry: 'best' | 'maneuvers';
  declare fev1Ml: number | null;
  declare fvcMl: number | null;
  declare pefLS: number | null;
  declare fef2575LS: number | null;
  declare quality: CreationOptional<string | null>;
  declare note: string | null;
  declare recordedBy: string;
  declare version: CreationOptional<number>;
  declare voidedAt: CreationOptional<Date | null>;
  declare voidedBy: CreationOptional<string | null>;
  declare voidReason: CreationOptional<VoidReason | null>;
  declare voidText: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initSpirometryTest(sequelize: Sequelize): void {
  SpirometryTest.init(
    {
      id: column.id(),
      clinicId: column.uuid(),
      patientId: column.uuid(),
      visitId: column.uuid(),
      performedAt: column.instant(),
      heightCm: column.decimal('heightCm', 4, 1),
      heightMethod: column.textColumn(),
      weightKg: column.decimal('weightKg', 4, 1),
      bronchodilator: column.textColumn(),
      drug: column.textColumn(),
      doseMcg: column.decimal('doseMcg', 8, 1),
      minutesSinceDose: column.integer(),
      ownBronchodilatorHoursAgo: column.decimal('ownBronchodilatorHoursAgo', 5, 1),
      entry: column.textColumn(),
      fev1Ml: { ...column.integer(), field: 'fev1_ml' },
      fvcMl: { ...column.integer(), field: 'fvc_ml' },
      pefLS: { ...column.decimal('pefLS', 6, 3), field: 'pef_l_s' },
      fef2575LS: { ...column.decimal('fef2575LS', 6, 3), field: 'fef2575_l_s' },
      quality: column.textColumn(),
      note: column.textColumn(),
      ...column.entryColumns(),
    },
    { sequelize, tableName: 'spirometry_tests', modelName: 'SpirometryTest' },
  );
}
