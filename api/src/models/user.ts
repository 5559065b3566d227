import type { Role } from '@slighthill/shared/permissions';
import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import * as column from './columns';

export class User extends Model<InferAttributes<User>, InferCreationAttributes<User>> {
  declare id: string;
  declare clinicId: string;
  declare email: string;
  declare displayName: string;
  declare credential: CreationOptional<string | null>;
  declare roles: Role[];
  declare passwordHash: CreationOptional<string | null>;
  declare patientId: CreationOptional<string | null>;
  declare disabledAt: CreationOptional<Date | null>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initUser(sequelize: Sequelize): void {
  User.init(
    {
      id: column.id(),
      clinicId: column.uuid(),
      email: column.textColumn(),
      displayName: column.textColumn(),
      credential: column.textColumn(),
      roles: column.textArray(),
      passwordHash: column.textColumn(),
      patientId: column.uuid(),
      disabledAt: column.instant(),
      version: column.versionColumn(),
      createdAt: column.instant(),
      updatedAt: column.instant(),
    },
    { sequelize, tableName: 'users', modelName: 'User' },
  );
}
