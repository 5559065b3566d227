import { abilities, type Ability, type Role } from '@slighthill/shared/permissions';

const clinicalStaff = ['coordinator', 'therapist', 'pulmonologist'] as const satisfies readonly Role[];

/** Which roles hold which ability: the one place that decides. A person with several roles holds all they give. */
const matrix: Record<Ability, readonly Role[]> = {
  'clinic:manage': ['administrator'],
  'users:manage': ['administrator'],
  'programs:read': ['administrator', 'coordinator'],
  'programs:manage': ['administrator'],
  'audit:read': ['administrator'],
  'patients:read': clinicalStaff,
  'patients:write': ['coordinator'],
  'enrollments:read': clinicalStaff,
  'enrollments:write': ['coordinator'],
  'tests:read': clinicalStaff,
  'tests:write': clinicalStaff,
  'file:read': clinicalStaff,
  'file:write': clinicalStaff,
  'oxygen:order': ['pulmonologist'],
  'holds:release': ['pulmonologist'],
  'trends:read': clinicalStaff,
  'predictions:compute': clinicalStaff,
  'flags:resolve': ['therapist', 'pulmonologist'],
  'drafts:own': clinicalStaff,
  'me:read': ['patient'],
};

/** The abilities a set of roles adds up to, in the order of the shared list. */
export function abilitiesOf(roles: readonly Role[]): Ability[] {
  return abilities.filter((ability) => matrix[ability].some((role) => roles.includes(role)));
}

export function rolesMay(roles: readonly Role[], ability: Ability): boolean {
  return matrix[ability].some((role) => roles.includes(role));
}
