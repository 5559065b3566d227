import { requireTransaction } from '../db/in-transaction';
import { execute } from '../db/query';
import type { Patient } from '../models/patient';
import type { ActorClinic } from '../policies/actor';
import { summaryOf } from '../queries/summary-of';
import { trendSource } from '../queries/trend-source';
import type { Clock } from './command-context';

interface SummaryContext {
  actor: {
    clinicId: string;
    clinic: Pick<ActorClinic, 'timeZone' | 'ratioRule' | 'fev1SeverityRule' | 'tlcSeverityRule' | 'tlcWindowDays'>;
  };
  clock: Clock;
}

/**
 * Writes the summary row of each of a patient's enrollments from the same computation as the trend answer. Called in
 * the transaction of everything that changes a result, so that a summary never lags behind its sources.
 */
export async function refreshSummaries(context: SummaryContext, patient: Pick<Patient, 'id'>): Promise<void> {
  requireTransaction();
  const source = await trendSource(context.actor, patient.id);
  for (const enrollment of source.enrollments) {
    const summary = summaryOf(source, context.actor.clinic, enrollment.id);
    await execute(
      `insert into enrollment_summaries
         (enrollment_id, clinic_id, patient_id, pattern, measures, last_test_on, computed_at)
       values ($enrollmentId, $clinicId, $patientId, $pattern::jsonb, $measures::jsonb, $lastTestOn, $now)
       on conflict (enrollment_id) do update set pattern = excluded.pattern, measures = excluded.measures,
         last_test_on = excluded.last_test_on, computed_at = excluded.computed_at`,
      {
        enrollmentId: enrollment.id,
        clinicId: context.actor.clinicId,
        patientId: patient.id,
        pattern: summary.pattern === null ? null : JSON.stringify(summary.pattern),
        measures: JSON.stringify(summary.measures),
        lastTestOn: summary.lastTestOn,
        now: context.clock.now(),
      },
    );
  }
}
