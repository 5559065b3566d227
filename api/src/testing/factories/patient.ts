import { searchKey } from '@slighthill/shared/search-key';
import { randomUUID } from 'node:crypto';
import { Patient } from '../../models/patient';

let serial = 0;

/** A patient written straight to the table; 67 years old on the test clock's day unless told otherwise. */
export async function makePatient(clinicId: string, values: Partial<Patient> = {}): Promise<Patient> {
  serial += 1;
  const { givenName = 'Test', familyName = `Patient ${serial}` } = values;
  const recordNumber = values.recordNumber ?? `T${process.pid}-${serial}-${randomUUID().slice(0, 6)}`;
  return await Patient.create({
    id: randomUUID(),
    clinicId,
    birthDate: '1959-03-02',
    sexForPrediction: 'male',
    diagnosisGroup: 'copd',
    ...(values as object),
    givenName,
    familyName,
    givenKey: searchKey(givenName),
    familyKey: searchKey(familyName),
    recordNumber,
    recordKey: searchKey(recordNumber),
  });
}
