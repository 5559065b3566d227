import { describe, expect, it } from 'vitest';
import type { TrendSeries } from '@slighthill/shared/contracts/trend';
import { dayNumber } from '@slighthill/shared/calendar';
import { crosses, freestPlace, labelPlace, type Segment } from './label-room';
import { llnLine } from './lln-line';
import { llnPath, plotLabels } from './plot-labels';
import { aPoint, aSeries, atsErsBands, fev1Series } from './testing/trend-fixture';
import { trendLayout } from './trend-layout';
import type { TrendView } from './trend-view';

const course = { startOn: '2026-09-14', endOn: '2026-12-09', endWord: 'Planned end' };

/** A walk that ends on its lower limit, as the limit falls with age. */
const onItsLimit = aSeries(
  'sixMinuteWalkDistance',
  [
    aPoint('2026-08-31', 318, { role: 'baseline', lln: 365, predicted: 518 }),
    aPoint('2026-10-12', 364, { role: 'latest', lln: 364, predicted: 517 }),
  ],
  { unit: 'm', zone: 30 },
);

const labelsOf = (series: TrendSeries, view: TrendView, width: number, bands = series.bands) => {
  const layout = trendLayout({ series, view, bands, course, width });
  const lln = llnLine(series, view);
  const verticals = [course.startOn, course.endOn].map((on): Segment => {
    const x = layout.x(dayNumber(on));
    return { x1: x, y1: layout.frame.top, x2: x, y2: layout.frame.bottom };
  });
  const path = lln ? llnPath(layout, lln) : [];
  const limit = path.slice(1).map((to, index): Segment => {
    const from = path[index] ?? to;
    return { x1: from.x, y1: from.y, x2: to.x, y2: to.y };
  });
  return { labels: plotLabels({ series, view, bands, layout, course, lln }), lines: [...verticals, ...limit] };
};

describe('crosses', () => {
  const box = { left: 100, top: 100, width: 50, height: 16 };

  it('tells lines through a box from lines beside it', () => {
    expect(crosses({ x1: 120, y1: 0, x2: 120, y2: 300 }, box)).toBe(true);
    expect(crosses({ x1: 0, y1: 108, x2: 300, y2: 108 }, box)).toBe(true);
    expect(crosses({ x1: 0, y1: 0, x2: 300, y2: 260 }, box)).toBe(true);
    expect(crosses({ x1: 160, y1: 0, x2: 160, y2: 300 }, box)).toBe(false);
    expect(crosses({ x1: 0, y1: 130, x2: 300, y2: 130 }, box)).toBe(false);
    expect(crosses({ x1: 120, y1: 0, x2: 120, y2: 90 }, box)).toBe(false);
  });
});

describe('freestPlace', () => {
  it('takes the first free place, and the least crossed one where none is', () => {
    const within = { left: 0, top: 0, width: 400, height: 300 };
    const places = [labelPlace(20, 50, 'start', 60), labelPlace(20, 90, 'start', 60)];
    const through = (y: number): Segment => ({ x1: 0, y1: y, x2: 400, y2: y });
    expect(freestPlace(places, { within, lines: [], boxes: [] })?.y).toBe(50);
    expect(freestPlace(places, { within, lines: [through(45)], boxes: [] })?.y).toBe(90);
    expect(freestPlace(places, { within, lines: [through(45), through(44), through(85)], boxes: [] })?.y).toBe(90);
    expect(freestPlace(places, { within: { ...within, height: 60 }, lines: [through(45)], boxes: [] })?.y).toBe(50);
  });
});

describe('plotLabels', () => {
  it.each<[string, TrendSeries, TrendView, number]>([
    ['a walk on its limit', onItsLimit, 'value', 1064],
    ['a walk on its limit, on a phone', onItsLimit, 'value', 350],
    ['FEV1 in percent', fev1Series, 'percent-predicted', 1064],
    ['FEV1 in percent where the course ends near the last test', fev1Series, 'percent-predicted', 760],
    ['FEV1 as z-score', { ...fev1Series, bands: [] }, 'z', 1064],
  ])('keep clear of the limit and of the course: %s', (_, series, view, width) => {
    const { labels, lines } = labelsOf(series, view, width, view === 'percent-predicted' ? atsErsBands : []);
    for (const label of [labels.latest, labels.lln]) {
      expect(label && lines.filter((line) => crosses(line, label.box))).toEqual([]);
    }
  });

  it('leave the words right of the latest point where nothing is in their way', () => {
    const free = { ...fev1Series, points: fev1Series.points.map((point) => ({ ...point, lln: null })) };
    const layout = trendLayout({ series: free, view: 'value', bands: [], course: null, width: 1064 });
    const last = layout.marks.find((mark) => mark.point.role === 'latest');
    const earlier = { ...layout, x: layout.x, frame: { ...layout.frame, right: layout.frame.right + 300 } };
    const { latest } = plotLabels({ series: free, view: 'value', bands: [], layout: earlier, course: null, lln: null });
    expect(latest).toMatchObject({ strong: '1.38 L', rest: 'Oct 12', anchor: 'start', y: (last?.y ?? 0) + 5 });
  });
});
