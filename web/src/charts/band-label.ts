import type { TrendPoint, TrendSeries } from '@slighthill/shared/contracts/trend';

/** Words of the band a point lies in: its own where it has them, else those of the band. Null without a band. */
export const bandLabel = (series: TrendSeries, point: TrendPoint): string | null =>
  point.bandLabel ?? series.bands.find((band) => band.id === point.band)?.label ?? null;
