import { lazy, Suspense, useRef, useState } from 'react';
import type { TrendResponse } from '@slighthill/shared/contracts/trend';
import { numbersSentence, rulesSentence } from './pattern-sentences';
import { useFocusBack } from './use-focus-back';
import type { SummaryView } from './use-summary-view';

const RuleDialog = lazy(() => import('./rule-dialog').then((module) => ({ default: module.RuleDialog })));

interface PatternSummaryProps {
  trends: TrendResponse;
  view: SummaryView;
}

const clinicRules = { referenceSet: null, group: null, gradingRule: null, ratioRule: null };

/** The pattern, then its numbers, then the rules that produced them, with a way to look by other rules. */
export const PatternSummary = ({ trends, view }: PatternSummaryProps) => {
  const [choosing, setChoosing] = useState(false);
  const changeRule = useRef<HTMLButtonElement>(null);
  const focusBackTo = useFocusBack(choosing);
  const { pattern } = trends;
  const changed = Object.values(view.rules).some((value) => value !== null);
  return (
    <section
      aria-label="Pattern"
      className="grid gap-x-6 gap-y-2 margin:grid-cols-[264px_minmax(0,1fr)] print:grid-cols-[180px_minmax(0,1fr)]"
    >
      <h2 tabIndex={-1} className="text-record">
        {pattern?.heading ?? 'No pattern yet'}
      </h2>
      <div>
        {pattern ? (
          <p>
            {numbersSentence(pattern, trends).map((phrase, index) =>
              typeof phrase === 'string' ? phrase : <strong key={index}>{phrase.strong}</strong>,
            )}
          </p>
        ) : (
          <p>A pattern needs a spirometry test with FEV1 and FVC that may be predicted.</p>
        )}
        <p className="mt-1 text-note text-ink-soft">
          {pattern && `${rulesSentence(pattern, trends, view.rules)} `}
          <button
            ref={changeRule}
            type="button"
            data-print="hide"
            onClick={({ currentTarget }) => {
              focusBackTo(currentTarget);
              setChoosing(true);
            }}
            className="link -my-1 inline-flex min-h-6 items-center"
          >
            Change rule
          </button>
        </p>
        {changed && (
          <p className="mt-2 text-note text-gorse">
            These are not your clinic’s rules. Only this view is changed.{' '}
            <button
              type="button"
              data-print="hide"
              onClick={() => {
                view.changeRules(clinicRules);
                changeRule.current?.focus();
              }}
              className="link inline-flex min-h-6 items-center"
            >
              Back to the clinic’s rules
            </button>
          </p>
        )}
      </div>
      {choosing && (
        <Suspense>
          <RuleDialog
            rules={view.rules}
            pattern={pattern}
            onClose={() => setChoosing(false)}
            onChoose={(rules) => {
              setChoosing(false);
              view.changeRules(rules);
            }}
          />
        </Suspense>
      )}
    </section>
  );
};
