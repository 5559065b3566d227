import type { Measure } from '@slighthill/shared/measures';
import { unitInName } from '../../../charts/format-measure';

/** What stands beside a result while it is entered: its unit, or of a score "of 27"; nothing its name says already. */
export const unitBeside = ({ id, unit, absolute }: Measure): string => {
  if (unit.symbol !== '') return unitInName(id, unit.symbol) ? '' : unit.symbol;
  return unit.ucum === '{score}' && absolute ? `of ${absolute.max}` : '';
};
