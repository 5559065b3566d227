import { getReferenceSet } from '../reference-sets/index';
import type { ReferenceSetId } from '../reference-sets/types';

export interface InputError {
  path: string;
  message: string;
}

/**
 * The two legacy sets need an ancestry group, asked each time and never stored (rule PV-6). Returns what is wrong with
 * the input, or null. Predictions and trends both use it before they compute.
 * @example checkGroup('gli-2012', undefined)?.path // group
 */
export function checkGroup(referenceSet: ReferenceSetId | undefined, group: string | undefined): InputError | null {
  const groups = referenceSet ? getReferenceSet(referenceSet).groups : null;
  if (!groups || groups.includes(group ?? '')) return null;
  const { title } = getReferenceSet(referenceSet ?? 'gli-global-2022');
  const asked = group ? `${title} has no group "${group}"` : `${title} needs a group`;
  return { path: 'group', message: `${asked}: choose ${groups.join(', ')}` };
}
