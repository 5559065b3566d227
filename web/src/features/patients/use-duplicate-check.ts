import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef, useState, type RefObject } from 'react';
import { useDebounced } from '../../lib/use-debounced';
import { duplicateQuery, type KnownPatient, type PersonToCheck } from './queries';

export interface DuplicateCheck {
  /** Who this may be; null when no one is known or each was said to be someone else. */
  question: KnownPatient | null;
  others: number;
  place: RefObject<HTMLDivElement | null>;
  someoneElse: () => void;
  /** Saving waits for the check's answer; with a question open the focus goes there. */
  mayGoOn: () => Promise<boolean>;
  waiting: boolean;
}

const trimmed = ({ givenName, familyName, birthDate }: PersonToCheck): PersonToCheck => ({
  givenName: givenName.trim(),
  familyName: familyName.trim(),
  birthDate,
});

const isComplete = ({ givenName, familyName, birthDate }: PersonToCheck): boolean =>
  givenName !== '' && familyName !== '' && /^[12]\d{3}-\d{2}-\d{2}$/.test(birthDate);

/**
 * Patients with the same name and birth date, once all three are there. A failed check stays silent: it never blocks.
 * `ownId` is the patient being entered, who may be stored already when an answer to saving got lost.
 */
export const useDuplicateCheck = (typed: PersonToCheck, ownId: string): DuplicateCheck => {
  const client = useQueryClient();
  const key = JSON.stringify(trimmed(typed));
  const settled = useDebounced(key, 300);
  const [asked, setAsked] = useState('');
  const [answered, setAnswered] = useState<readonly string[]>([]);
  const [waiting, setWaiting] = useState(false);
  const place = useRef<HTMLDivElement>(null);
  const wanted = useRef(false);

  // Saving does not wait for the typing to settle.
  const person = JSON.parse(asked === key ? key : settled) as PersonToCheck;
  const complete = isComplete(person);
  const check = useQuery({ ...duplicateQuery(person), enabled: complete });
  const open = (found: readonly KnownPatient[]): KnownPatient[] =>
    found.filter(({ id }) => id !== ownId && !answered.includes(id));
  const known = open((complete && check.data?.items) || []);

  useEffect(() => {
    if (!wanted.current || !place.current) return;
    wanted.current = false;
    place.current.focus();
  });

  const mayGoOn = async (): Promise<boolean> => {
    const now = trimmed(typed);
    if (!isComplete(now)) return true;
    setAsked(key);
    setWaiting(true);
    try {
      const { items } = await client.ensureQueryData(duplicateQuery(now));
      const free = open(items).length === 0;
      wanted.current = !free;
      return free;
    } catch {
      return true;
    } finally {
      setWaiting(false);
    }
  };

  return {
    question: known[0] ?? null,
    others: Math.max(known.length - 1, 0),
    place,
    someoneElse: () => setAnswered((before) => [...before, ...known.map(({ id }) => id)]),
    mayGoOn,
    waiting,
  };
};
