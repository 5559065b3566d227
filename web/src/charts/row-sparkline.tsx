import type { TrendSeries } from '@slighthill/shared/contracts/trend';
import { describeTrend } from './describe-trend';
import { smallTrendLayout } from './small-trend-layout';
import { SmallTrendPlot } from './small-trend-plot';

const size = { width: 132, height: 28 };

interface RowSparklineProps {
  series: TrendSeries;
}

/** A trend in a table row: the same zone and line, no numbers; the words stand in its name. */
export const RowSparkline = ({ series }: RowSparklineProps) => {
  const layout = smallTrendLayout(series, size);
  return (
    <svg role="img" aria-label={describeTrend(series, 'value')} viewBox="0 0 132 28" width={132} height={28}>
      {layout && <SmallTrendPlot layout={layout} width={size.width} />}
    </svg>
  );
};
