import type { DiagnosisGroup, SexForPrediction } from '@slighthill/shared/contracts/patient';
import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import * as column from './columns';

export class Patient extends Model<InferAttributes<Patient>, InferCreationAttributes<Patient>> {
  declare id: string;
  declare clinicId: string;
  declare givenName: string;
  declare familyName: string;
  declare givenKey: string;
  declare familyKey: string;
  declare birthDate: string;
  declare sexForPrediction: SexForPrediction;
  declare diagnosisGroup: DiagnosisGroup;
  declare recordNumber: string;
  declare recordKey: string;
  declare email: CreationOptional<string | null>;
  declare phone: CreationOptional<string | null>;
  declare list: CreationOptional<'none' | 'current' | 'finished'>;
  declare createdBy: CreationOptional<string | null>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initPatient(sequelize: Sequelize): void {
  Patient.init(
    {
      id: column.id(),
      clinicId: column.uuid(),
      givenName: column.textColumn(),
      familyName: column.textColumn(),
      givenKey: column.textColumn(),
      familyKey: column.textColumn(),
      birthDate: column.calendarDate(),
      sexForPrediction: column.textColumn(),
      diagnosisGroup: column.textColumn(),
      recordNumber: column.textColumn(),
      recordKey: column.textColumn(),
      email: column.textColumn(),
      phone: column.textColumn(),
      list: { ...column.textColumn(), defaultValue: 'none' },
      createdBy: column.uuid(),
      version: column.versionColumn(),
      createdAt: column.instant(),
      updatedAt: column.instant(),
    },
    { sequelize, tableName: 'patients', modelName: 'Patient' },
  );
}
