import type { TrendSeries } from '@slighthill/shared/contracts/trend';
import { getMeasure, isMeasureId } from '@slighthill/shared/measures';
import { cx } from '../ui/cx';
import { Icon } from '../ui/icon';
import { formatResult, formatValue } from './format-measure';
import { stateWords } from './rule-words';
import { smallTrendLayout } from './small-trend-layout';
import { SmallTrendPlot } from './small-trend-plot';
import { fromToWords, verdictWords } from './verdict-words';

const size = { width: 206, height: 66 };

/** "m, higher is better", "of 40, lower is better", "after bronchodilator". */
const underName = (series: TrendSeries): string => {
  if (series.state !== null) return stateWords[series.state];
  if (!isMeasureId(series.measure)) return series.unit;
  const { unit, direction, absolute, step } = getMeasure(series.measure);
  const isScore = unit.symbol === '' && step === 1 && absolute !== null;
  const scale = isScore ? `of ${absolute.max}` : unit.symbol;
  const better = direction === 'none' ? '' : `${direction} is better`;
  return [scale, better].filter((words) => words !== '').join(', ');
};

const toneOf = { better: 'text-fern', worse: 'text-rowan' } as const;

interface SmallTrendProps {
  series: TrendSeries;
  /** Brings this measure into the large chart. */
  onChoose: () => void;
}

export const SmallTrend = ({ series, onChoose }: SmallTrendProps) => {
  const name = isMeasureId(series.measure) ? getMeasure(series.measure).shortLabel : series.measure;
  const layout = smallTrendLayout(series, size);
  const { words, verdict, icon } = verdictWords(series);
  const last = series.latest ?? series.baseline ?? series.points.at(-1);
  const at = layout?.points.at(-1);
  return (
    <button
      type="button"
      onClick={onChoose}
      className="-m-2 block max-w-68 rounded-control p-2 text-left transition-shadow duration-120 hover:ring-1 hover:ring-edge"
    >
      <span className="block">
        <span className="text-body font-bold">{name}</span>{' '}
        <span className="text-note text-ink-soft">{underName(series)}</span>
      </span>
      <svg
        aria-hidden="true"
        viewBox="0 0 248 66"
        width={248}
        height={66}
        className="my-2 block max-w-full font-sans print:my-0 print:h-auto"
      >
        {layout && <SmallTrendPlot layout={layout} width={size.width} />}
        {last && (
          <text x={214} y={(at?.y ?? 33) + 6} fontSize={17} fontWeight={700} fill="var(--ink)">
            {formatValue(series.measure, last.value)}
          </text>
        )}
      </svg>
      <span
        className={cx(
          'flex items-center gap-2 text-verdict',
          verdict === 'better' || verdict === 'worse' ? toneOf[verdict] : 'text-ink-soft',
        )}
      >
        <Icon name={icon} size={16} />
        {words}
      </span>
      <span className="block text-note text-ink-soft">
        {fromToWords(series) ?? (last ? formatResult(series.measure, last.value, series.unit) : '')}
      </span>
    </button>
  );
};
