import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import * as column from './columns';

export class Flag extends Model<InferAttributes<Flag>, InferCreationAttributes<Flag>> {
  declare id: string;
  declare clinicId: string;
  declare patientId: string;
  declare rule: string;
  declare status: CreationOptional<'open' | 'resolved'>;
  declare raisedAt: Date;
  declare resolvedAt: CreationOptional<Date | null>;
  declare resolvedBy: CreationOptional<string | null>;
  declare resolution: CreationOptional<string | null>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export class FlagOccurrence extends Model<InferAttributes<FlagOccurrence>, InferCreationAttributes<FlagOccurrence>> {
  declare id: string;
  declare clinicId: string;
  declare flagId: string;
  declare sourceKind: string;
  declare sourceId: string;
  declare detail: string;
  declare occurredAt: Date;
  declare withdrawnAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
}

export function initFlag(sequelize: Sequelize): void {
  Flag.init(
    {
      id: column.id(),
      clinicId: column.uuid(),
      patientId: column.uuid(),
      rule: column.textColumn(),
      status: { ...column.textColumn(), defaultValue: 'open' },
      raisedAt: column.instant(),
      resolvedAt: column.instant(),
      resolvedBy: column.uuid(),
      resolution: column.textColumn(),
      version: column.versionColumn(),
      createdAt: column.instant(),
      updatedAt: column.instant(),
    },
    { sequelize, tableName: 'flags', modelName: 'Flag' },
  );
  FlagOccurrence.init(
    {
      id: column.id(),
      clinicId: column.uuid(),
      flagId: column.uuid(),
      sourceKind: column.textColumn(),
      sourceId: column.uuid(),
      detail: column.textColumn(),
      occurredAt: column.instant(),
      withdrawnAt: column.instant(),
      createdAt: column.instant(),
    },
    { sequelize, tableName: 'flag_occurrences', modelName: 'FlagOccurrence', updatedAt: false },
  );
}
