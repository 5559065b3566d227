import type { ReactNode } from 'react';
import { edgesOf, type BandEdge } from '@slighthill/shared/format';
import { limitWords } from '../../../charts/band-strips';
import { capitalize, gradingRuleLabel } from '../../../charts/rule-words';
import { VisuallyHidden } from '../../../ui/visually-hidden';
import { derivedRows, type DerivedSet } from './derived-rows';
import { ZStrip, ZStripScale } from './z-strip';

interface DerivedPanelProps {
  sets: readonly DerivedSet[];
  severityRule: string;
  updating: boolean;
  /** What the numbers rest on, below the table. */
  children: ReactNode;
}

/** Pattern and band of the last set that has them, with the rule that produced the band. */
const Verdict = ({ sets, severityRule }: Pick<DerivedPanelProps, 'sets' | 'severityRule'>) => {
  const prediction = sets.findLast((set) => set.prediction?.pattern)?.prediction;
  const pattern = prediction?.pattern;
  if (!pattern) return null;
  const { severity } = pattern;
  // A heading that speaks of the two ratio rules is shown whole; else its band follows by itself.
  const rulesDiffer = pattern.lowByFixedRatio !== pattern.lowByLln;
  const band = severity && prediction.bands?.[severity.measure]?.find(({ id }) => id === severity.bandId);
  const limits = band ? limitWords(band, false) : null;
  return (
    <>
      <span className="font-semibold">{severity && !rulesDiffer ? pattern.label : pattern.heading}</span>
      {severity && (
        <>
          <span className="rounded-tag bg-band-obstructive-2 px-2 font-semibold">
            {capitalize(severity.label)}
            {limits && `, ${limits}`}
          </span>
          <span className="text-note text-ink-soft">{gradingRuleLabel(severity.rule)}</span>
        </>
      )}
      {!severity && <span className="text-note text-ink-soft">{`No band by ${gradingRuleLabel(severityRule)}`}</span>}
    </>
  );
};

/** Edges that rounding of the FEV1's percent predicted must not cross (rule 0.4). */
const percentEdges = (sets: DerivedPanelProps['sets']): BandEdge[] => {
  const bands = sets.findLast((set) => set.prediction)?.prediction?.bands?.fev1 ?? [];
  return edgesOf(bands.filter(({ quantity }) => quantity === 'percent-predicted'));
};

const head = 'pb-1 pl-2 text-right text-head text-ink-soft row:pl-3 row:whitespace-nowrap';
const cell = 'pl-2 text-right row:pl-3 whitespace-nowrap';

/** Derived, not typed: follows what is typed, a moment later. */
export const DerivedPanel = ({ sets, severityRule, updating, children }: DerivedPanelProps) => (
  <section aria-label="Best of this test" aria-busy={updating} className="rounded-sheet bg-mist px-4 py-3">
    <p className="flex min-h-6 flex-wrap items-center gap-x-3 gap-y-1">
      <strong>Best of this test</strong>
      <Verdict sets={sets} severityRule={severityRule} />
      {updating && <span className="ml-auto text-note text-ink-soft">Working it out</span>}
    </p>
    <table className="mt-2 w-full border-collapse">
      <VisuallyHidden as="caption">Best values with percent predicted and z-score</VisuallyHidden>
      <thead>
        <tr className="border-b border-rule">
          <th scope="col" className="pb-1 text-left text-head text-ink-soft">
            <VisuallyHidden>Measure</VisuallyHidden>
          </th>
          {sets.map((set) => (
            <th key={set.title} scope="col" className={head}>
              {set.title}
            </th>
          ))}
          {sets.length > 1 && (
            <th scope="col" className={head}>
              Change
            </th>
          )}
          <th scope="col" className={head}>
            % pred.
          </th>
          <th scope="col" className={head}>
            z-score
          </th>
          <th scope="col" className="w-42 pb-1 pl-5 text-head max-row:hidden">
            <VisuallyHidden>Place of the z-score</VisuallyHidden>
            <ZStripScale />
          </th>
        </tr>
      </thead>
      <tbody>
        {derivedRows(sets, percentEdges(sets)).map((row) => (
          <tr key={row.id} className="h-9 border-b border-rule">
            <th scope="row" className="text-left font-normal whitespace-nowrap">
              {row.label}
            </th>
            {row.values.map((value, index) => (
              <td key={index} className={index === sets.length - 1 ? `${cell} font-bold` : `${cell} text-ink-soft`}>
                {value}
              </td>
            ))}
            {sets.length > 1 && <td className={`${cell} text-note`}>{row.change}</td>}
            <td className={`${cell} font-bold`}>{row.percent}</td>
            <td className={cell}>{row.z}</td>
            <td className="pl-5 max-row:hidden">
              {row.points.length > 0 && <ZStrip measure={row.label} points={row.points} />}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
    <div className="mt-2 text-note text-ink-soft">{children}</div>
  </section>
);
