import type { FileEntryKind } from '@slighthill/shared/contracts/file-entry';
import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import type { ClinicalEntry, VoidReason } from './clinical-entry';
import * as column from './columns';

export class FileEntry
  extends Model<InferAttributes<FileEntry>, InferCreationAttributes<FileEntry>>
  implements ClinicalEntry
{
  declare id: string;
  declare clinicId: string;
  declare patientId: string;
  declare kind: FileEntryKind;
  declare onDate: string;
  declare details: Record<string, unknown>;
  declare note: string | null;
  declare releasedAt: CreationOptional<Date | null>;
  declare releasedBy: CreationOptional<string | null>;
  declare releaseReason: CreationOptional<string | null>;
  declare recordedBy: string;
  declare version: CreationOptional<number>;
  declare voidedAt: CreationOptional<Date | null>;
  declare voidedBy: CreationOptional<string | null>;
  declare voidReason: CreationOptional<VoidReason | null>;
  declare voidText: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initFileEntry(sequelize: Sequelize): void {
  FileEntry.init(
    {
      id: column.id(),
      clinicId: column.uuid(),
      patientId: column.uuid(),
      kind: column.textColumn(),
      onDate: column.calendarDate(),
      details: column.json(),
      note: column.textColumn(),
      releasedAt: column.instant(),
      releasedBy: column.uuid(),
      releaseReason: column.textColumn(),
      ...column.entryColumns(),
    },
    { sequelize, tableName: 'file_entries', modelName: 'FileEntry' },
  );
}
