import type { SessionKind } from '@slighthill/shared/contracts/clinic';
import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import * as column from './columns';

export class Program extends Model<InferAttributes<Program>, InferCreationAttributes<Program>> {
  declare id: string;
  declare clinicId: string;
  declare name: string;
  declare plannedSessions: number;
  declare weeks: number;
  declare sessionsPerDay: number;
  declare sessionsPerWeek: number;
  declare sessionKinds: SessionKind[];
  declare retiredAt: CreationOptional<Date | null>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initProgram(sequelize: Sequelize): void {
  Program.init(
    {
      id: column.id(),
      clinicId: column.uuid(),
      name: column.textColumn(),
      plannedSessions: column.integer(),
      weeks: column.integer(),
      sessionsPerDay: column.integer(),
      sessionsPerWeek: column.integer(),
      sessionKinds: column.textArray(),
      retiredAt: column.instant(),
      version: column.versionColumn(),
      createdAt: column.instant(),
      updatedAt: column.instant(),
    },
    { sequelize, tableName: 'programs', modelName: 'Program' },
  );
}
