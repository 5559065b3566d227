import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import * as column from './columns';

/** Who saw or changed what. Append-only in the database. */
export class AuditEvent extends Model<InferAttributes<AuditEvent>, InferCreationAttributes<AuditEvent>> {
  declare id: CreationOptional<string>;
  declare clinicId: string;
  declare at: Date;
  declare actorId: string | null;
  declare actorName: string;
  declare action: string;
  declare outcome: 'done' | 'refused';
  declare patientIds: string[];
  declare entityKind: string | null;
  declare entityId: string | null;
  declare address: string | null;
  declare detail: Record<string, unknown>;
}

export function initAuditEvent(sequelize: Sequelize): void {
  AuditEvent.init(
    {
      id: { type: 'BIGINT', primaryKey: true, autoIncrement: true },
      clinicId: column.uuid(),
      at: column.instant(),
      actorId: column.uuid(),
      actorName: column.textColumn(),
      action: column.textColumn(),
      outcome: column.textColumn(),
      patientIds: column.uuidArray(),
      entityKind: column.textColumn(),
      entityId: column.uuid(),
      address: column.textColumn(),
      detail: column.json(),
    },
    { sequelize, tableName: 'audit_events', modelName: 'AuditEvent', timestamps: false },
  );
}
