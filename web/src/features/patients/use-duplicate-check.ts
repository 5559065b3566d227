import { useQuery } from '@tanstack/react-query';
import { useDebounced } from '../../lib/use-debounced';
import { duplicateQuery, type KnownPatient } from './queries';

/** Patients with the same name and birth date, once all three are there. A failed check stays silent: it never blocks. */
export const useDuplicateCheck = (givenName: string, familyName: string, birthDate: string): KnownPatient[] => {
  const person = useDebounced([givenName.trim(), familyName.trim(), birthDate].join('\n'), 300);
  const [given = '', family = '', born = ''] = person.split('\n');
  const complete = given !== '' && family !== '' && /^[12]\d{3}-\d{2}-\d{2}$/.test(born);
  const check = useQuery({
    ...duplicateQuery({ givenName: given, familyName: family, birthDate: born }),
    enabled: complete,
  });
  return complete ? (check.data?.items ?? []) : [];
};
