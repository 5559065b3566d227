/** Columns naming who recorded and who voided an entry; joins users as r and v. */
export const entryPeopleColumns = /* sql */ `
  e.recorded_by as "recordedById", r.display_name as "recordedByName", e.created_at as "recordedAt", e.version,
  e.voided_at as "voidedAt", e.voided_by as "voidedById", v.display_name as "voidedByName",
  e.void_reason as "voidReason", e.void_text as "voidText"`;

export const entryPeopleJoins = /* sql */ `
  join users r on r.id = e.recorded_by
  left join users v on v.id = e.voided_by`;

export interface EntryPeople {
  recordedById: string;
  recordedByName: string;
  recordedAt: Date;
  version: number;
  voidedAt: Date | null;
  voidedById: string | null;
  voidedByName: string | null;
  voidReason: 'wrong-patient' | 'wrong-test' | 'duplicate' | 'other' | null;
  voidText: string | null;
}
