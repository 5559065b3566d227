import { Link } from 'react-router-dom';
import { useState } from 'react';
import type { TrendPoint, TrendSeries } from '@slighthill/shared/contracts/trend';
import { formatDate } from '../lib/clinic-time';
import { Icon } from '../ui/icon';
import { Cell, HeaderCell, Row, Table, TableBody, TableHead } from '../ui/table';
import { bandLabel } from './band-label';
import { describeTrend } from './describe-trend';
import { formatInView, formatResult } from './format-measure';
import { capitalize, stateWords } from './rule-words';
import { availableViews, type TrendView } from './trend-view';

interface TrendTableProps {
  series: TrendSeries;
  view: TrendView;
  /** Where a point's test is shown. */
  hrefOf: (point: TrendPoint) => string;
}

const roleWords = { baseline: 'Baseline', latest: 'Latest' } as const;

const standing = (point: TrendPoint): string => {
  if (point.role) return roleWords[point.role];
  if (point.compared) return 'Compared';
  return point.reason ? `Not compared: ${point.reason}` : 'Not compared';
};

const noteOf = (point: TrendPoint): string | null =>
  point.compared && point.reason ? capitalize(`${point.reason}.`) : null;

const dash = <span className="text-ink-soft">none</span>;

/** The chart's twin: every point with the same numbers, and why it is left out where it is. */
export const TrendTable = ({ series, view, hrefOf }: TrendTableProps) => {
  const [newestFirst, setNewestFirst] = useState(false);
  const { measure, unit, bands } = series;
  const views = availableViews(series);
  const points = newestFirst ? [...series.points].reverse() : series.points;
  const hasStates = series.points.some((point) => point.state !== null);
  const has = { percent: views.includes('percent-predicted'), z: views.includes('z') };
  const graded = series.points.some((point) => point.graded);
  const inView = (value: number | null | undefined, as: TrendView) =>
    value == null ? dash : formatInView(measure, value, as, unit, bands);
  return (
    <div className="min-h-75">
      <Table caption={describeTrend(series, view)}>
        <TableHead>
          <HeaderCell aria-sort={newestFirst ? 'descending' : 'ascending'}>
            <button
              type="button"
              onClick={() => setNewestFirst((before) => !before)}
              className="inline-flex min-h-6 items-center gap-1 rounded-tag font-semibold"
            >
              Date
              <Icon name={newestFirst ? 'down' : 'up'} size={14} />
            </button>
          </HeaderCell>
          <HeaderCell numeric>Result</HeaderCell>
          {has.percent && <HeaderCell numeric>Percent predicted</HeaderCell>}
          {has.z && <HeaderCell numeric>z-score</HeaderCell>}
          {(has.percent || has.z) && <HeaderCell numeric>LLN</HeaderCell>}
          {graded && <HeaderCell>Band</HeaderCell>}
          {hasStates && <HeaderCell>State</HeaderCell>}
          <HeaderCell>Compared</HeaderCell>
        </TableHead>
        <TableBody>
          {points.map((point) => (
            <Row key={`${point.sourceId} ${point.takenAt}`}>
              <Cell asHeader className="whitespace-nowrap">
                <Link to={hrefOf(point)} className="link">
                  {formatDate(point.takenOn)}
                </Link>
              </Cell>
              <Cell label="Result" numeric className="whitespace-nowrap">
                {formatResult(measure, point.value, unit)}
              </Cell>
              {has.percent && (
                <Cell label="Predicted" numeric>
                  {inView(point.percentPredicted, 'percent-predicted')}
                </Cell>
              )}
              {has.z && (
                <Cell label="z-score" numeric>
                  {inView(point.z ?? point.zApproximate, 'z')}
                </Cell>
              )}
              {(has.percent || has.z) && (
                <Cell label="LLN" numeric>
                  {point.lln === null ? dash : formatResult(measure, point.lln, unit)}
                </Cell>
              )}
              {graded && <Cell label="Band">{(point.graded && bandLabel(series, point)) || dash}</Cell>}
              {hasStates && <Cell label="State">{point.state ? capitalize(stateWords[point.state]) : dash}</Cell>}
              <Cell label="Compared" className={point.compared ? '' : 'text-ink-soft'}>
                {standing(point)}
                {noteOf(point) && <span className="block text-note text-ink-soft">{noteOf(point)}</span>}
              </Cell>
            </Row>
          ))}
        </TableBody>
      </Table>
    </div>
  );
};
