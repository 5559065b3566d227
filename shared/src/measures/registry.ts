/** What other workspaces see of the measure registry. */
export { getMeasure, isMeasureId, measures } from './all-measures';
export { measureIds, type MeasureId } from './measure-ids';
export { measureGroups } from './types';
export type * from './types';
export { checkValue, type ValueCheck } from './check-value';
export { fromStored, toStored } from './stored-value';
export { heightLimitsCm, questionHeight } from './height';
