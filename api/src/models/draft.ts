import { Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';
import * as column from './columns';

/** Work not yet in the record: seen by its owner only, gone after seven days. */
export class Draft extends Model<InferAttributes<Draft>, InferCreationAttributes<Draft>> {
  declare id: string;
  declare clinicId: string;
  declare ownerId: string;
  declare form: string;
  declare subject: string;
  declare content: Record<string, unknown>;
  declare savedAt: Date;
  declare expiresAt: Date;
}

export function initDraft(sequelize: Sequelize): void {
  Draft.init(
    {
      id: column.id(),
      clinicId: column.uuid(),
      ownerId: column.uuid(),
      form: column.textColumn(),
      subject: column.textColumn(),
      content: column.json(),
      savedAt: column.instant(),
      expiresAt: column.instant(),
    },
    { sequelize, tableName: 'drafts', modelName: 'Draft', timestamps: false },
  );
}
