import { describe, expect, it } from 'vitest';
import { bandStrips, limitWords } from './band-strips';
import { courseLabels } from './course-labels';
import { dodge } from './dodge';
import { differenceBracket } from './important-difference';
import { llnLine } from './lln-line';
import { legendEntries, markKind } from './mark-kind';
import { niceTicks } from './nice-ticks';
import { smallTrendLayout } from './small-trend-layout';
import { aPoint, aSeries, atsErsBands, catSeries, fev1Series, ratioSeries, walkSeries } from './testing/trend-fixture';
import { dayDomain, timeTicks } from './time-axis';
import { trendLayout } from './trend-layout';
import { availableViews, bandsToDraw, defaultView } from './trend-view';
import { valueDomain } from './value-domain';

const course = { startOn: '2026-09-14', endOn: '2026-12-09', endWord: 'Planned end' };

describe('niceTicks', () => {
  it('gives five to seven ticks in steps of 1, 2 or 5 over very different ranges', () => {
    for (const [from, to] of [
      [0, 3.9],
      [22.4, 82.6],
      [0, 352],
      [-5.3, 0.4],
      [0.2, 0.55],
      [0, 40],
      [70, 100],
      [0, 1200],
      [3, 3.4],
    ] as const) {
      const { ticks, to: end } = niceTicks(from, to, 0.001);
      expect(ticks.length, `${from} to ${to}`).toBeGreaterThanOrEqual(5);
      expect(ticks.length, `${from} to ${to}`).toBeLessThanOrEqual(7);
      const step = (ticks[1] ?? 0) - (ticks[0] ?? 0);
      const digit = step / 10 ** Math.floor(Math.log10(step) + 1e-9);
      expect([1, 2, 5], `${from} to ${to}`).toContain(Math.round(digit * 1e6) / 1e6);
      expect(ticks[0]).toBeGreaterThanOrEqual(from);
      expect(end).toBeGreaterThanOrEqual(ticks.at(-1) ?? Infinity);
    }
  });

  it('keeps whole-number grades on whole numbers', () => {
    expect(niceTicks(0, 3.2, 1).ticks).toEqual([0, 1, 2, 3, 4]);
  });
});

describe('valueDomain', () => {
  it('starts where the registry says in the raw view', () => {
    expect(valueDomain(walkSeries, 'value', []).from).toBe(0);
    expect(valueDomain(ratioSeries, 'value', []).from).toBe(0.2);
  });

  it('goes below the registry start rather than lose a point', () => {
    const low = aSeries('spo2Nadir', [aPoint('2026-01-05', 66)], { unit: '%' });
    expect(valueDomain(low, 'value', []).from).toBe(66);
  });

  it('holds every band limit, the LLN and the bracket in percent predicted', () => {
    const { from, to, ticks } = valueDomain(fev1Series, 'percent-predicted', atsErsBands);
    expect(from).toBeLessThan(35);
    expect(from).toBeGreaterThan(10);
    expect(to).toBeGreaterThan(73.4);
    expect(ticks).toEqual([30, 40, 50, 60, 70, 80]);
  });
});

describe('time axis', () => {
  it('thins month names so that each keeps 44 px', () => {
    const domain = dayDomain(fev1Series, course);
    for (const width of [200, 320, 480, 870]) {
      const ticks = timeTicks(domain, width);
      const px = width / (domain.to - domain.from);
      expect(ticks.length).toBeGreaterThan(0);
      ticks.slice(1).forEach((tick, index) => {
        expect((tick.day - (ticks[index]?.day ?? 0)) * px).toBeGreaterThanOrEqual(40);
      });
    }
  });

  it('names the year on the first tick and on January', () => {
    const long = aSeries('cat', [aPoint('2025-11-03', 20), aPoint('2026-03-02', 18)]);
    const ticks = timeTicks(dayDomain(long, null), 900);
    expect(ticks.filter((tick) => tick.year !== null).map(({ month, year }) => `${month} ${year}`)).toEqual([
      'Nov 2025',
      'Jan 2026',
    ]);
  });

  it('gives a single test three months of room and keeps the whole course in sight', () => {
    const one = aSeries('cat', [aPoint('2026-08-31', 22)]);
    const alone = dayDomain(one, null);
    expect(alone.to - alone.from).toBeGreaterThanOrEqual(90);
    const withCourse = dayDomain(one, course);
    expect(withCourse.to).toBeGreaterThan(20_796);
  });
});

describe('marks', () => {
  it('says state and quality by shape', () => {
    const spirometry = { state: 'after', quality: 'A' } as const;
    expect(markKind(aPoint('2026-01-01', 1, spirometry))).toBe('filled');
    expect(markKind(aPoint('2026-01-01', 1, { ...spirometry, state: 'before' }))).toBe('open');
    expect(markKind(aPoint('2026-01-01', 1, { ...spirometry, state: 'unknown' }))).toBe('diamond');
    expect(markKind(aPoint('2026-01-01', 1, { ...spirometry, quality: 'D' }))).toBe('dashed');
    expect(markKind(aPoint('2026-01-01', 1, { compared: false }))).toBe('open');
  });

  it('explains only the shapes that are drawn', () => {
    expect(legendEntries(fev1Series.points).map((entry) => entry.words)).toEqual([
      'after bronchodilator',
      'before',
      'not stated',
    ]);
    expect(legendEntries(catSeries.points)).toEqual([]);
    const other = [...walkSeries.points, aPoint('2026-11-02', 330, { compared: false, reason: 'course length 20 m' })];
    expect(legendEntries(other).map((entry) => entry.words)).toEqual(['compared', 'not compared']);
  });

  it('moves touching marks apart by at most 6 px each and leaves others alone', () => {
    const shifts = dodge([
      { x: 100, y: 50, r: 5 },
      { x: 100, y: 52, r: 4.4 },
      { x: 200, y: 50, r: 5 },
    ]);
    expect(shifts[0]).toBeLessThan(0);
    expect(shifts[1]).toBeGreaterThan(0);
    expect(shifts.every((shift) => Math.abs(shift) <= 6)).toBe(true);
    expect((shifts[1] ?? 0) - (shifts[0] ?? 0)).toBeGreaterThan(9.4);
    expect(shifts[2]).toBe(0);
    expect(
      dodge([
        { x: 10, y: 0, r: 5 },
        { x: 10, y: 30, r: 5 },
      ]),
    ).toEqual([0, 0]);
  });
});

describe('bands', () => {
  const domain = { from: 22, to: 84, ticks: [] };

  it('cover the plot from edge to edge without gap or overlap', () => {
    const strips = bandStrips(fev1Series, atsErsBands, domain);
    expect(strips[0]?.from).toBe(22);
    expect(strips.at(-1)?.to).toBe(84);
    strips.slice(1).forEach((strip, index) => expect(strip.from).toBe(strips[index]?.to));
  });

  it('carry their limits in words', () => {
    expect(bandStrips(fev1Series, atsErsBands, domain).map((strip) => `${strip.label}, ${strip.limits}`)).toEqual([
      'very severe, under 35',
      'severe, 35 to under 50',
      'moderately severe, 50 to under 60',
      'moderate, 60 to under 70',
      'mild, 70 or more',
    ]);
    const inclusive = {
      id: 'b',
      label: 'b',
      quantity: 'percent-predicted',
      from: 40,
      to: 60,
      toInclusive: true,
    } as const;
    expect(limitWords(inclusive, false)).toBe('40 to 60');
    expect(limitWords({ ...inclusive, from: 60, to: null }, true)).toBe('over 60');
    expect(limitWords({ ...inclusive, quantity: 'z', from: -2.5, to: -1.645, toInclusive: false }, false)).toBe(
      '\u22122.5 to under \u22121.645',
    );
  });

  it('take restrictive colors for lung volumes and obstructive ones elsewhere', () => {
    const tlc = aSeries('tlc', [aPoint('2026-01-01', 5)]);
    expect(bandStrips(tlc, atsErsBands.slice(0, 1), domain)[0]?.fill).toBe('var(--band-restrictive-1)');
    expect(bandStrips(fev1Series, atsErsBands.slice(0, 1), domain)[0]?.fill).toBe('var(--band-obstructive-1)');
  });

  it('are drawn only for an abnormal pattern, in the view of their rule, or for a graded score', () => {
    expect(bandsToDraw(fev1Series, 'percent-predicted', true)).toHaveLength(5);
    expect(bandsToDraw(fev1Series, 'percent-predicted', false)).toEqual([]);
    expect(bandsToDraw(fev1Series, 'value', true)).toEqual([]);
    expect(bandsToDraw(catSeries, 'value', false)).toHaveLength(4);
    const ungraded = { ...catSeries, points: catSeries.points.map((point) => ({ ...point, graded: false })) };
    expect(bandsToDraw(ungraded, 'value', true)).toEqual([]);
  });
});

describe('views', () => {
  it('never offers percent predicted for a ratio', () => {
    expect(availableViews(ratioSeries)).toEqual(['value', 'z']);
    expect(availableViews(fev1Series)).toEqual(['percent-predicted', 'value', 'z']);
    expect(availableViews(catSeries)).toEqual(['value']);
  });

  it('opens lung function in percent predicted, a walk in meters, a z rule in z', () => {
    expect(defaultView(fev1Series)).toBe('percent-predicted');
    expect(defaultView(walkSeries)).toBe('value');
    expect(defaultView({ ...fev1Series, bands: [{ id: 'a', label: 'a', quantity: 'z', from: null, to: null }] })).toBe(
      'z',
    );
  });
});

describe('difference bracket and LLN', () => {
  it('gives the important difference in the view of the chart, its size in the raw unit', () => {
    expect(differenceBracket(fev1Series, 'value')).toMatchObject({ from: 1.22, to: 1.42, size: '0.10 L each way' });
    const percent = differenceBracket(fev1Series, 'percent-predicted');
    expect(percent?.to).toBeCloseTo(44 + 100 / 30, 6);
    expect(percent?.size).toBe('0.10 L each way');
    expect(differenceBracket(fev1Series, 'z')).toBeNull();
    expect(differenceBracket(ratioSeries, 'value')).toBeNull();
  });

  it('labels the LLN with its latest value in each view', () => {
    expect(llnLine(fev1Series, 'percent-predicted')?.label).toBe('LLN, 73');
    expect(llnLine(fev1Series, 'value')?.label).toBe('LLN, 2.20');
    expect(llnLine(fev1Series, 'z')?.label).toBe('LLN, \u22121.645');
    expect(llnLine(catSeries, 'value')).toBeNull();
    expect(llnLine(fev1Series, 'value')?.steady).toBe(true);
    const falling = fev1Series.points.map((point, index) => ({ ...point, lln: 2.3 - index * 0.02 }));
    expect(llnLine({ ...fev1Series, points: falling }, 'value')).toMatchObject({ label: 'LLN, 2.18', steady: false });
  });
});

describe('courseLabels', () => {
  const room = { left: 34, width: 1064, narrow: false };
  const words = (start: number, end: number | null) =>
    courseLabels(course, { ...room, start, end }).map((label) => `${label.anchor} ${label.words}`);

  it('stand between the verticals where they fit, else outside, else as one phrase', () => {
    expect(words(600, 850)).toEqual(['start Enrolled Sep 14', 'end Planned end Dec 9']);
    expect(words(600, 750)).toEqual(['end Enrolled Sep 14', 'end Planned end Dec 9']);
    expect(words(600, 650)).toEqual(['end Enrolled Sep 14', 'start Planned end Dec 9']);
    expect(words(980, 1030)).toEqual(['end Enrolled Sep 14, planned end Dec 9']);
    expect(words(600, null)).toEqual(['start Enrolled Sep 14']);
  });
});

describe('trendLayout', () => {
  const wide = trendLayout({ series: fev1Series, view: 'percent-predicted', bands: atsErsBands, course, width: 1064 });

  it('keeps a gutter of 172 for the band names, less below 480 px of plot', () => {
    expect(wide.frame.right).toBe(892);
    expect(wide.narrow).toBe(false);
    const phone = trendLayout({
      series: fev1Series,
      view: 'percent-predicted',
      bands: atsErsBands,
      course,
      width: 350,
    });
    expect(phone.narrow).toBe(true);
    expect(phone.frame.right).toBe(266);
  });

  it('draws every point inside the plot and joins only comparable ones', () => {
    expect(wide.marks).toHaveLength(7);
    for (const mark of wide.marks) {
      expect(mark.x).toBeGreaterThan(wide.frame.left);
      expect(mark.x).toBeLessThan(wide.frame.right);
      expect(mark.y).toBeGreaterThan(wide.frame.top);
      expect(mark.y).toBeLessThan(wide.frame.bottom);
    }
    expect(wide.line).toHaveLength(3);
    expect(wide.stems).toHaveLength(2);
  });

  it('never gets narrower than nothing, as on a page laid out for paper', () => {
    const tiny = trendLayout({ series: fev1Series, view: 'percent-predicted', bands: atsErsBands, course, width: 60 });
    expect(tiny.frame.right).toBeGreaterThanOrEqual(tiny.frame.left);
  });

  it('leaves out points without a number in the view', () => {
    const some = {
      ...fev1Series,
      points: fev1Series.points.map((point, index) => (index === 0 ? { ...point, z: null } : point)),
    };
    expect(trendLayout({ series: some, view: 'z', bands: [], course: null, width: 1064 }).marks).toHaveLength(6);
  });
});

describe('smallTrendLayout', () => {
  it('starts at the baseline, keeps comparable points only, and centers the zone on the baseline', () => {
    const layout = smallTrendLayout(fev1Series, { width: 206, height: 66 });
    expect(layout?.points).toHaveLength(3);
    expect((layout?.zone?.y ?? 0) + (layout?.zone?.height ?? 0) / 2).toBeCloseTo(layout?.baselineY ?? -1, 6);
    expect(smallTrendLayout(ratioSeries, { width: 206, height: 66 })?.zone).toBeNull();
    expect(smallTrendLayout(aSeries('cat', []), { width: 206, height: 66 })).toBeNull();
  });
});
