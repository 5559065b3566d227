import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import * as column from './columns';

/** A single-use link to choose a password; only a hash of its token is kept. */
export class AccountLink extends Model<InferAttributes<AccountLink>, InferCreationAttributes<AccountLink>> {
  declare id: string;
  declare tokenHash: string;
  declare userId: string;
  declare expiresAt: Date;
  declare usedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
}

export function initAccountLink(sequelize: Sequelize): void {
  AccountLink.init(
    {
      id: column.id(),
      tokenHash: column.textColumn(),
      userId: column.uuid(),
      expiresAt: column.instant(),
      usedAt: column.instant(),
      createdAt: column.instant(),
    },
    { sequelize, tableName: 'account_links', modelName: 'AccountLink', updatedAt: false },
  );
}
