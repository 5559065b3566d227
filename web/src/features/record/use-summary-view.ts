import { useSearchParams } from 'react-router-dom';
import { gradingRuleIds, ratioRules, referenceGroups, referenceSetIds } from '@slighthill/shared/vocabulary';
import type { TrendSeries } from '@slighthill/shared/contracts/trend';
import { getMeasure, isMeasureId } from '@slighthill/shared/measures';
import { availableViews, defaultView, isTrendView, type TrendView } from '../../charts/trend-view';
import type { TrendRules } from './queries';

const lastMeasureKey = 'slighthill.last-measure';

const readLast = (): string | null => {
  try {
    return window.localStorage.getItem(lastMeasureKey);
  } catch {
    return null;
  }
};

const keepLast = (measure: string): void => {
  try {
    window.localStorage.setItem(lastMeasureKey, measure);
  } catch {
    // Without storage the chart opens on the walk test each time.
  }
};

const oneOf = (allowed: readonly string[], value: string | null): string | null =>
  value !== null && allowed.includes(value) ? value : null;

const groupsOf = (set: string | null): readonly string[] =>
  set === null ? [] : ((referenceGroups as Readonly<Record<string, readonly string[]>>)[set] ?? []);

/** The rules in the address; a legacy set without its group is not asked for. */
export const rulesFromSearch = (search: URLSearchParams): TrendRules => {
  const set = oneOf(referenceSetIds, search.get('set'));
  const group = oneOf(groupsOf(set), search.get('group'));
  return {
    referenceSet: groupsOf(set).length > 0 && group === null ? null : set,
    group,
    gradingRule: oneOf(gradingRuleIds, search.get('rule')),
    ratioRule: oneOf(ratioRules, search.get('ratio')),
  };
};

const isWalk = (series: TrendSeries): boolean =>
  isMeasureId(series.measure) && getMeasure(series.measure).referenceKind === 'walk';

/** The measure in the address, else the one last viewed, else the walk test, else the first. */
export const chooseSeries = (all: readonly TrendSeries[], asked: string | null, last: string | null) =>
  all.find((series) => series.measure === asked) ??
  all.find((series) => series.measure === last) ??
  all.find(isWalk) ??
  all[0] ??
  null;

/** What the summary shows, kept in the address so that it can be sent and comes back with the back button. */
export const useSummaryView = () => {
  const [search, setSearch] = useSearchParams();
  const change = (values: Record<string, string | null>): void =>
    setSearch(
      (before) => {
        const next = new URLSearchParams(before);
        for (const [name, value] of Object.entries(values)) {
          if (value === null) next.delete(name);
          else next.set(name, value);
        }
        return next;
      },
      { replace: true, preventScrollReset: true },
    );
  const asked = search.get('view');
  return {
    rules: rulesFromSearch(search),
    asTable: search.get('table') === '1',
    seriesOf: (all: readonly TrendSeries[]) => chooseSeries(all, search.get('measure'), readLast()),
    viewOf: (series: TrendSeries): TrendView =>
      isTrendView(asked) && availableViews(series).includes(asked) ? asked : defaultView(series),
    showMeasure: (measure: string) => {
      keepLast(measure);
      change({ measure, view: null });
    },
    showView: (view: TrendView) => change({ view }),
    showTable: (asTable: boolean) => change({ table: asTable ? '1' : null }),
    changeRules: (rules: TrendRules) =>
      change({
        set: rules.referenceSet,
        group: rules.group,
        rule: rules.gradingRule,
        ratio: rules.ratioRule,
        view: null,
      }),
  };
};

export type SummaryView = ReturnType<typeof useSummaryView>;
