import { useRef } from 'react';
import type { TrendResponse, TrendSeries } from '@slighthill/shared/contracts/trend';
import { SinceBaseline } from './since-baseline';
import { TrendPanel } from './trend-panel';
import type { SummaryView } from './use-summary-view';

interface SummaryChartsProps {
  trends: TrendResponse;
  series: TrendSeries;
  view: SummaryView;
}

/** Loaded on demand, with the drawing code. */
export const SummaryCharts = ({ trends, series, view }: SummaryChartsProps) => {
  const heading = useRef<HTMLHeadingElement>(null);
  // The chosen small chart leaves its place, so the focus goes where its measure went.
  const choose = (measure: string): void => {
    view.showMeasure(measure);
    heading.current?.focus();
  };
  return (
    <>
      <TrendPanel trends={trends} series={series} view={view} headingRef={heading} />
      <SinceBaseline all={trends.series} current={series} onChoose={choose} />
    </>
  );
};
