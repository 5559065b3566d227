import type { MeasureId, ReferenceKind } from '@slighthill/shared/measures';
import { enrightSherrill1998 } from './enright-sherrill-1998/enright-sherrill-1998';
import { gli2012 } from './gli-2012/gli-2012';
import { gli2017TransferFactor } from './gli-2017-transfer-factor/gli-2017-transfer-factor';
import { gli2021LungVolumes } from './gli-2021-lung-volumes/gli-2021-lung-volumes';
import { gliGlobal2022 } from './gli-global-2022/gli-global-2022';
import { nhanesIii1999 } from './nhanes-iii-1999/nhanes-iii-1999';
import { referenceSetIds, type ReferenceSet, type ReferenceSetId } from './types';

/** The one list of reference sets. Adding a set is adding its folder, its id and this line. */
const byId: Record<ReferenceSetId, ReferenceSet> = {
  'gli-global-2022': gliGlobal2022,
  'gli-2012': gli2012,
  'nhanes-iii-1999': nhanesIii1999,
  'gli-2021-lung-volumes': gli2021LungVolumes,
  'gli-2017-transfer-factor': gli2017TransferFactor,
  'enright-sherrill-1998': enrightSherrill1998,
};

const defaults: Record<ReferenceKind, ReferenceSetId> = {
  spirometry: 'gli-global-2022',
  'lung-volumes': 'gli-2021-lung-volumes',
  'transfer-factor': 'gli-2017-transfer-factor',
  walk: 'enright-sherrill-1998',
};

export const referenceSets: readonly ReferenceSet[] = referenceSetIds.map((id) => byId[id]);
export const getReferenceSet = (id: ReferenceSetId): ReferenceSet => byId[id];
export const defaultReferenceSet = (kind: ReferenceKind): ReferenceSet => byId[defaults[kind]];

/** The set used for a measure: the chosen one where it is of the measure's kind, else the default of that kind. */
export function referenceSetFor(
  measure: MeasureId,
  kind: ReferenceKind | null,
  chosen: ReferenceSet | null,
): ReferenceSet | null {
  if (kind === null) return null;
  const set = chosen?.kind === kind ? chosen : defaultReferenceSet(kind);
  return set.measures.includes(measure) ? set : null;
}

export { referenceSetIds } from './types';
export type * from './types';
