import type { Patient } from '../models/patient';
import type { CommandContext } from './command-context';
import { refreshCarriedHeights } from './refresh-carried-heights';
import { refreshCombinedMeasures } from './refresh-combined-measures';
import { refreshSummaries } from './refresh-summaries';

/**
 * What every change of a result ends with, in its own transaction: heights carried to other results, measures that
 * follow from several, and the summaries.
 */
export async function bringInLine(
  context: CommandContext,
  patient: Patient,
  { heights = true }: { heights?: boolean } = {},
): Promise<void> {
  if (heights) await refreshCarriedHeights(context, patient);
  await refreshCombinedMeasures(context, patient);
  await refreshSummaries(context, patient);
}
