import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import * as column from './columns';

export class AuthSession extends Model<InferAttributes<AuthSession>, InferCreationAttributes<AuthSession>> {
  declare id: string;
  declare tokenHash: string;
  declare userId: string;
  declare expiresAt: Date;
  declare lastActiveAt: Date;
  declare createdAt: CreationOptional<Date>;
}

export function initAuthSession(sequelize: Sequelize): void {
  AuthSession.init(
    {
      id: column.id(),
      tokenHash: column.textColumn(),
      userId: column.uuid(),
      expiresAt: column.instant(),
      lastActiveAt: column.instant(),
      createdAt: column.instant(),
    },
    { sequelize, tableName: 'auth_sessions', modelName: 'AuthSession', updatedAt: false },
  );
}
