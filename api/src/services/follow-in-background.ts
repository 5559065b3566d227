import type { Clinic } from '../models/clinic';
import { rebuildClinicSummaries } from './rebuild-enrollment-summaries';

const running = new Map<string, Promise<void>>();

/**
 * Works a clinic's summaries out again without keeping the answer waiting; one run a clinic at a time, the newest
 * rules last. A run that is cut short is made good by `npm run summaries:rebuild` or by the next result.
 */
export function followInBackground(clinic: Clinic): void {
  const earlier = running.get(clinic.id) ?? Promise.resolve();
  const run = earlier
    .then(() => rebuildClinicSummaries(clinic))
    .then(
      () => undefined,
      () => undefined,
    )
    .then(() => {
      if (running.get(clinic.id) === run) running.delete(clinic.id);
    });
  running.set(clinic.id, run);
}

/** Resolves when nothing is left to follow; for an orderly stop and for tests. */
export async function summariesSettled(): Promise<void> {
  await Promise.all(running.values());
}
