import type { DemoPerson, Standing } from './plan-people';

/** Things that happen to one patient each, so that every screen has an example. */
export const specials = {
  'positive-item9': 'active',
  'missing-item9': 'active',
  'stated-height': 'active',
  'amended-walk': 'active',
  'voided-duplicate': 'active',
  'hold-released': 'active',
  'hold-open-in-course': 'active',
  'hold-open-before-course': 'planned',
  'settled-item9': 'completed',
  'height-measured-again': 'completed',
  'other-course-length': 'completed',
  'amended-spirometry': 'completed',
  'voided-wrong-patient': 'completed',
} as const satisfies Record<string, Standing>;

export type Special = keyof typeof specials;

/** Gives each special to the next person of its standing; in a small clinic some find nobody. */
export function assignSpecials(people: readonly DemoPerson[]): Map<string, Special> {
  const taken = new Map<string, Special>();
  for (const [special, standing] of Object.entries(specials) as [Special, Standing][]) {
    const person = people.find((candidate) => candidate.standing === standing && !taken.has(candidate.id));
    if (person) taken.set(person.id, special);
  }
  return taken;
}
