import { Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';
import * as column from './columns';

export const entityKinds = ['spirometry-test', 'measurement', 'body-size', 'file-entry'] as const;
export type EntityKind = (typeof entityKinds)[number];

/** What an entry said before a change. Append-only in the database. */
export class ClinicalRevision extends Model<
  InferAttributes<ClinicalRevision>,
  InferCreationAttributes<ClinicalRevision>
> {
  declare id: string;
  declare clinicId: string;
  declare patientId: string;
  declare entityKind: EntityKind;
  declare entityId: string;
  declare version: number;
  declare snapshot: Record<string, unknown>;
  declare reason: string;
  declare changedBy: string;
  declare changedAt: Date;
}

export function initClinicalRevision(sequelize: Sequelize): void {
  ClinicalRevision.init(
    {
      id: column.id(),
      clinicId: column.uuid(),
      patientId: column.uuid(),
      entityKind: column.textColumn(),
      entityId: column.uuid(),
      version: column.integer(),
      snapshot: column.json(),
      reason: column.textColumn(),
      changedBy: column.uuid(),
      changedAt: column.instant(),
    },
    { sequelize, tableName: 'clinical_revisions', modelName: 'ClinicalRevision', timestamps: false },
  );
}
