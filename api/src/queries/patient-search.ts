import { searchKey } from '@slighthill/shared/search-key';

/** One way a patient can match, read from one index; branches are shown in order, each in its own sort order. */
export interface SearchBranch {
  where: string;
  sort: readonly [string, string];
  bind: Record<string, string>;
}

const byName = ['family_key', 'given_key'] as const;
const byGivenName = ['given_key', 'family_key'] as const;
/** Sorts after every text that starts with the prefix before it (the columns sort by code point). */
const last = '\u{10FFFF}';

/**
 * Turns search words into index ranges: family names first, then given names, then record numbers; two or more words
 * are given and family name in either order; a date is a birth date.
 */
export function searchBranches(search: string): SearchBranch[] {
  const date = asDate(search);
  if (date) return [{ where: 'birth_date = $date', sort: byName, bind: { date } }];
  const words = searchKey(search.replace(/,/g, ' ')).split(' ').filter(Boolean);
  if (words.length === 0) return [{ where: 'true', sort: byName, bind: {} }];
  if (words.length > 1) return words.slice(1).flatMap((_, index) => splitAt(words, index + 1));
  const bind = { word: words[0]!, wordEnd: words[0]! + last };
  const starts = (column: string) => `${column} >= $word and ${column} < $wordEnd`;
  return [
    { where: starts('family_key'), sort: byName, bind },
    { where: starts('given_key'), sort: byGivenName, bind },
    { where: starts('record_key'), sort: ['record_key', 'family_key'], bind },
  ];
}

function splitAt(words: string[], at: number): SearchBranch[] {
  const [first, second] = [words.slice(0, at).join(' '), words.slice(at).join(' ')];
  const bind = (family: string, given: string, name: string) => ({
    [`family${name}`]: family,
    [`familyEnd${name}`]: family + last,
    [`given${name}`]: given,
    [`givenEnd${name}`]: given + last,
  });
  const where = (name: string) =>
    `family_key >= $family${name} and family_key < $familyEnd${name}
     and given_key >= $given${name} and given_key < $givenEnd${name}`;
  return [
    { where: where(`A${at}`), sort: byName, bind: bind(second, first, `A${at}`) },
    { where: where(`B${at}`), sort: byName, bind: bind(first, second, `B${at}`) },
  ];
}

/** Reads 1959-03-02 or 3/2/1959 (month first); anything else is no date. */
function asDate(search: string): string | null {
  const text = search.trim();
  const iso = /^(\d{4})-(\d{1,2})-(\d{1,2})$/.exec(text);
  const slashed = /^(\d{1,2})\/(\d{1,2})\/(\d{4})$/.exec(text);
  const [year, month, day] = iso ? iso.slice(1).map(Number) : slashed ? [3, 1, 2].map((i) => Number(slashed[i])) : [];
  if (!year || !month || !day) return null;
  const date = new Date(Date.UTC(year, month - 1, day));
  if (date.getUTCMonth() !== month - 1 || date.getUTCDate() !== day) return null;
  return date.toISOString().slice(0, 10);
}
