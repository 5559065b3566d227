import type { TrendBand, TrendSeries } from '@slighthill/shared/contracts/trend';
import { formatNumber } from '@slighthill/shared/format';
import { getMeasure, isMeasureId } from '@slighthill/shared/measures';
import type { ValueDomain } from './value-domain';

export interface BandStrip {
  id: string;
  label: string;
  limits: string;
  from: number;
  to: number;
  /** A theme color, or none for "within normal limits". */
  fill: string | null;
}

const limitText = (limit: number): string => {
  const decimals = String(limit).split('.')[1]?.length ?? 0;
  return formatNumber(limit, decimals);
};

/** "60 to under 70", "70 or more", "under 35"; a limit that is included says so by leaving "under" out. */
export const limitWords = (band: TrendBand, startsAbove: boolean): string => {
  if (band.from === null && band.to === null) return 'any value';
  if (band.from === null) return `${band.toInclusive ? 'up to' : 'under'} ${limitText(band.to ?? 0)}`;
  if (band.to === null) return startsAbove ? `over ${limitText(band.from)}` : `${limitText(band.from)} or more`;
  const from = startsAbove ? `over ${limitText(band.from)}` : limitText(band.from);
  return `${from} to ${band.toInclusive ? '' : 'under '}${limitText(band.to)}`;
};

export type BandFamily = 'obstructive' | 'restrictive';

/** Lung volumes speak of restriction; everything else takes the obstructive colors. */
export const bandFamily = (measure: string): BandFamily =>
  isMeasureId(measure) && getMeasure(measure).group === 'lung-volumes' ? 'restrictive' : 'obstructive';

/** The part of each band that the chart shows, from the lowest up. */
export const bandStrips = (series: TrendSeries, bands: readonly TrendBand[], domain: ValueDomain): BandStrip[] => {
  const family = bandFamily(series.measure);
  const rising = [...bands].sort((a, b) => (a.from ?? -Infinity) - (b.from ?? -Infinity));
  return rising.flatMap((band, index): BandStrip[] => {
    const from = Math.max(band.from ?? -Infinity, domain.from);
    const to = Math.min(band.to ?? Infinity, domain.to);
    if (to <= from) return [];
    const fill = band.colorStep == null ? null : `var(--band-${family}-${band.colorStep})`;
    const startsAbove = rising[index - 1]?.toInclusive === true;
    return [{ id: band.id, label: band.label, limits: limitWords(band, startsAbove), from, to, fill }];
  });
};
