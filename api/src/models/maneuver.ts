import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import * as column from './columns';

export class Maneuver extends Model<InferAttributes<Maneuver>, InferCreationAttributes<Maneuver>> {
  declare spirometryTestId: string;
  declare clinicId: string;
  declare number: number;
  declare fev1Ml: number;
  declare fvcMl: number;
  declare pefLS: number | null;
  declare fef2575LS: number | null;
  declare forcedTimeS: number | null;
  declare fev1Accepted: CreationOptional<boolean>;
  declare fvcAccepted: CreationOptional<boolean>;
  declare reason: string | null;
}

export function initManeuver(sequelize: Sequelize): void {
  Maneuver.init(
    {
      spirometryTestId: column.id(),
      clinicId: column.uuid(),
      number: { ...column.integer(), primaryKey: true },
      fev1Ml: { ...column.integer(), field: 'fev1_ml' },
      fvcMl: { ...column.integer(), field: 'fvc_ml' },
      pefLS: { ...column.decimal('pefLS', 6, 3), field: 'pef_l_s' },
      fef2575LS: { ...column.decimal('fef2575LS', 6, 3), field: 'fef2575_l_s' },
      forcedTimeS: column.decimal('forcedTimeS', 5, 2),
      fev1Accepted: { ...column.flag(), field: 'fev1_accepted' },
      fvcAccepted: { ...column.flag(), field: 'fvc_accepted' },
      reason: column.textColumn(),
    },
    { sequelize, tableName: 'maneuvers', modelName: 'Maneuver', timestamps: false },
  );
}
