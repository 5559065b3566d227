import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import * as column from './columns';

export class Clinic extends Model<InferAttributes<Clinic>, InferCreationAttributes<Clinic>> {
  declare id: string;
  declare name: string;
  declare timeZone: string;
  declare phone: CreationOptional<string | null>;
  declare ratioRule: CreationOptional<'fixed-ratio' | 'lln'>;
  declare fev1SeverityRule: CreationOptional<'ats-ers-2005' | 'ers-ats-2021' | 'gold'>;
  declare tlcSeverityRule: CreationOptional<'tlc-percent' | 'ers-ats-2021'>;
  declare tlcWindowDays: CreationOptional<number>;
  declare nextRecordNumber: CreationOptional<number>;
  declare demo: CreationOptional<boolean>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initClinic(sequelize: Sequelize): void {
  Clinic.init(
    {
      id: column.id(),
      name: column.textColumn(),
      timeZone: column.textColumn(),
      phone: column.textColumn(),
      ratioRule: { ...column.textColumn(), defaultValue: 'fixed-ratio' },
      fev1SeverityRule: { ...column.textColumn(), defaultValue: 'ats-ers-2005' },
      tlcSeverityRule: { ...column.textColumn(), defaultValue: 'tlc-percent' },
      tlcWindowDays: { ...column.integer(), defaultValue: 180 },
      nextRecordNumber: { ...column.integer(), defaultValue: 1001 },
      demo: { ...column.flag(), defaultValue: false },
      version: column.versionColumn(),
      createdAt: column.instant(),
      updatedAt: column.instant(),
    },
    { sequelize, tableName: 'clinics', modelName: 'Clinic' },
  );
}
