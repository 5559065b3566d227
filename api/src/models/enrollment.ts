import type { EnrollmentStatus } from '@slighthill/shared/contracts/patient';
import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import * as column from './columns';

export class Enrollment extends Model<InferAttributes<Enrollment>, InferCreationAttributes<Enrollment>> {
  declare id: string;
  declare clinicId: string;
  declare patientId: string;
  declare programId: string;
  declare status: EnrollmentStatus;
  declare startOn: string;
  declare plannedEndOn: string;
  declare plannedSessions: number;
  declare endedOn: CreationOptional<string | null>;
  declare consentOn: CreationOptional<string | null>;
  declare statusReason: CreationOptional<string | null>;
  declare firstExerciseOn: CreationOptional<string | null>;
  declare lastSessionOn: CreationOptional<string | null>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initEnrollment(sequelize: Sequelize): void {
  Enrollment.init(
    {
      id: column.id(),
      clinicId: column.uuid(),
      patientId: column.uuid(),
      programId: column.uuid(),
      status: column.textColumn(),
      startOn: column.calendarDate(),
      plannedEndOn: column.calendarDate(),
      plannedSessions: column.integer(),
      endedOn: column.calendarDate(),
      consentOn: column.calendarDate(),
      statusReason: column.textColumn(),
      firstExerciseOn: column.calendarDate(),
      lastSessionOn: column.calendarDate(),
      version: column.versionColumn(),
      createdAt: column.instant(),
      updatedAt: column.instant(),
    },
    { sequelize, tableName: 'enrollments', modelName: 'Enrollment' },
  );
}
