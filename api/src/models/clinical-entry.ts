import type { CreationOptional } from 'sequelize';

export type VoidReason = 'wrong-patient' | 'wrong-test' | 'duplicate' | 'other';

/** What the four kinds of clinical entry have in common; each model declares these attributes. */
export interface ClinicalEntry {
  id: string;
  clinicId: string;
  patientId: string;
  recordedBy: string;
  version: CreationOptional<number>;
  voidedAt: CreationOptional<Date | null>;
  voidedBy: CreationOptional<string | null>;
  voidReason: CreationOptional<VoidReason | null>;
  voidText: CreationOptional<string | null>;
  createdAt: CreationOptional<Date>;
  updatedAt: CreationOptional<Date>;
}
