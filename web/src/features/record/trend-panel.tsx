import type { Ref } from 'react';
import { useNavigate } from 'react-router-dom';
import type { TrendPoint, TrendResponse, TrendSeries } from '@slighthill/shared/contracts/trend';
import { getMeasure, isMeasureId } from '@slighthill/shared/measures';
import { measureTitle } from '../../charts/describe-trend';
import type { Course } from '../../charts/time-axis';
import { TrendChart } from '../../charts/trend-chart';
import { TrendTable } from '../../charts/trend-table';
import { availableViews, type TrendView } from '../../charts/trend-view';
import { changeWords, verdictWords } from '../../charts/verdict-words';
import { Button } from '../../ui/button';
import { cx } from '../../ui/cx';
import { Icon } from '../../ui/icon';
import { Segmented } from '../../ui/segmented';
import { Select } from '../../ui/select';
import { useRecord } from './record-context';
import type { SummaryView } from './use-summary-view';

interface TrendPanelProps {
  trends: TrendResponse;
  series: TrendSeries;
  view: SummaryView;
  /** Takes the focus when a small chart's measure moves up here. */
  headingRef: Ref<HTMLHeadingElement>;
}

const rawViewWords: Readonly<Record<string, string>> = { L: 'Liters', m: 'Meters', 'L/s': 'Liters per second' };

const viewLabel = (view: TrendView, unit: string): string => {
  if (view === 'percent-predicted') return '% predicted';
  return view === 'z' ? 'z-score' : (rawViewWords[unit] ?? 'Value');
};

const tones = { better: 'text-fern', worse: 'text-rowan' } as const;

const Verdict = ({ series }: { series: TrendSeries }) => {
  const { words, verdict, icon } = verdictWords(series);
  const change = changeWords(series);
  const judged = verdict === 'better' || verdict === 'worse';
  return (
    <p className="flex flex-wrap items-center gap-x-3.5">
      <span className={cx('inline-flex items-center gap-2 font-semibold', judged ? tones[verdict] : 'text-ink-soft')}>
        <Icon name={icon} size={16} />
        {verdict === null ? `${words}.` : words}
      </span>
      {change && !judged && <span className="text-note text-ink-soft">{change}</span>}
      {judged && <span className="text-note text-ink-soft">since baseline</span>}
    </p>
  );
};

const useCourse = (trends: TrendResponse): Course | null => {
  const { patient } = useRecord();
  const { enrollment } = trends;
  if (!enrollment) return null;
  const own = patient.enrollment?.id === enrollment.id ? patient.enrollment : null;
  const open = own ? own.endedOn === null : false;
  return { startOn: enrollment.startOn, endOn: enrollment.endOn, endWord: open ? 'Planned end' : 'Ended' };
};

/** The large chart with its verdict beside its name, its views, and its twin as a table. */
export const TrendPanel = ({ trends, series, view, headingRef }: TrendPanelProps) => {
  const { patient } = useRecord();
  const navigate = useNavigate();
  const course = useCourse(trends);
  const shown = view.viewOf(series);
  const views = availableViews(series);
  const abnormal = trends.pattern !== null && trends.pattern.id !== 'normal';
  const hrefOf = (point: TrendPoint): string =>
    `/patients/${patient.id}/tests/${point.sourceKind ?? 'measurement'}/${point.sourceId}`;
  return (
    <section aria-label="Trend" className="mt-6 print:mt-3">
      <div className="flex flex-wrap items-center gap-x-5 gap-y-2 pb-3 print:pb-0">
        <h2 ref={headingRef} tabIndex={-1} className="text-chart">
          {measureTitle(series, shown)}
        </h2>
        <Verdict series={series} />
        <div data-print="hide" className="ml-auto flex flex-wrap items-center gap-2">
          {trends.series.length > 1 && (
            <Select
              aria-label="Measure in the large chart"
              className="w-44 margin:hidden"
              value={series.measure}
              onChange={(event) => view.showMeasure(event.target.value)}
              choices={trends.series.map(({ measure }) => ({
                value: measure,
                label: isMeasureId(measure) ? getMeasure(measure).shortLabel : measure,
              }))}
            />
          )}
          {views.length > 1 && (
            <Segmented
              label="Scale"
              choices={views.map((value) => ({ value, label: viewLabel(value, series.unit) }))}
              value={shown}
              onValueChange={view.showView}
            />
          )}
          <Button icon={view.asTable ? 'bars' : 'table'} onClick={() => view.showTable(!view.asTable)}>
            {view.asTable ? 'Show as chart' : 'Show as table'}
          </Button>
        </div>
      </div>
      {view.asTable ? (
        <TrendTable series={series} view={shown} hrefOf={hrefOf} />
      ) : (
        <TrendChart
          key={`${series.measure} ${shown}`}
          series={series}
          view={shown}
          patternAbnormal={abnormal}
          course={course}
          onOpenPoint={(point) => void navigate(hrefOf(point))}
        />
      )}
    </section>
  );
};
