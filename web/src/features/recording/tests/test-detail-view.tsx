import type { ReactNode } from 'react';
import { formatInstant } from '../../../lib/clinic-time';
import { useClinicZone } from '../../../lib/session';
import { PageHeader } from '../../../ui/page-header';
import type { Fact } from '../history/fact';
import { FactList } from '../history/fact-list';
import { HistoryList } from '../history/history-list';
import { VoidedNotice } from '../history/voided-notice';
import { testName } from './describe-test';
import { ManeuverTable } from './maneuver-table';
import { recordedOf, type TestDetail } from './test-detail';
import { bodySizeFacts, measurementFacts, spirometryFacts, spirometryHistoryFacts } from './test-facts';

interface TestDetailViewProps {
  detail: TestDetail;
  actions: ReactNode;
}

const factsOf = (detail: TestDetail, timeZone: string): Fact[] => {
  if (detail.kind === 'spirometry-test') return spirometryFacts(detail.test, timeZone);
  return detail.kind === 'measurement'
    ? measurementFacts(detail.measurement, timeZone)
    : bodySizeFacts(detail.bodySize, timeZone);
};

/** A history compares the whole content, maneuver by maneuver; an earlier content has the shape of a present one. */
const historyFacts =
  (kind: TestDetail['kind'], timeZone: string) =>
  (content: Record<string, unknown>): Fact[] => {
    if (kind === 'spirometry-test') return spirometryHistoryFacts(content, timeZone);
    return kind === 'measurement' ? measurementFacts(content, timeZone) : bodySizeFacts(content, timeZone);
  };

const contentOf = (detail: TestDetail): Record<string, unknown> => {
  if (detail.kind === 'spirometry-test') return detail.test;
  return detail.kind === 'measurement' ? detail.measurement : detail.bodySize;
};

export const TestDetailView = ({ detail, actions }: TestDetailViewProps) => {
  const timeZone = useClinicZone();
  const { voided, recordedBy, recordedAt } = recordedOf(detail);
  const name = testName({
    kind: detail.kind,
    measure: detail.kind === 'measurement' ? detail.measurement.measure : null,
  });
  const inWords = historyFacts(detail.kind, timeZone);
  return (
    <article className="flex flex-col gap-6">
      <PageHeader
        level={2}
        title={name}
        note={`Entered by ${recordedBy.displayName}, ${formatInstant(recordedAt, timeZone)}`}
        actions={actions}
      />
      {voided && <VoidedNotice voided={voided} />}
      <div className={voided ? 'text-ink-soft line-through' : undefined}>
        <FactList facts={factsOf(detail, timeZone)} />
      </div>
      {detail.kind === 'spirometry-test' && detail.test.maneuvers.length > 0 && (
        <section>
          <h3 className="mb-2 text-section">Maneuvers</h3>
          <ManeuverTable maneuvers={detail.test.maneuvers} />
          <p className="mt-2 text-note text-ink-soft">Quality is not graded yet.</p>
        </section>
      )}
      <section aria-labelledby="test-history">
        <h3 id="test-history" className="mb-1 text-section">
          History
        </h3>
        <HistoryList history={detail.history} factsOf={inWords} now={inWords(contentOf(detail))} />
      </section>
    </article>
  );
};
