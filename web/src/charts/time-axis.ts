import type { TrendSeries } from '@slighthill/shared/contracts/trend';
import { dayNumber, fromDayNumber, parseDate } from '@slighthill/shared/calendar';

export interface Course {
  startOn: string;
  endOn: string | null;
  /** "Planned end" or "Ended". */
  endWord: string;
}

export interface DayDomain {
  from: number;
  to: number;
}

const shortestDays = 90;
const room = { before: 0.05, after: 0.04 };

/** From the first point to the last or the end of the course, at least three months. */
export const dayDomain = (series: TrendSeries, course: Course | null): DayDomain => {
  const days = series.points.map((point) => dayNumber(point.takenOn));
  if (course) days.push(dayNumber(course.startOn), ...(course.endOn ? [dayNumber(course.endOn)] : []));
  const first = Math.min(...days);
  const last = Math.max(...days, first + shortestDays);
  return { from: first - room.before * (last - first), to: last + room.after * (last - first) };
};

export interface TimeTick {
  day: number;
  month: string;
  /** On the first tick and on each January. */
  year: number | null;
}

const names = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'] as const;
const monthSteps = [1, 2, 3, 6, 12, 24, 60, 120] as const;
const daysPerMonth = 365.25 / 12;
/** A month's name keeps this much room; with its year it takes a little more. */
const namePx = 44;

/** Beginnings of months, thinned so that names keep their room. */
export const timeTicks = (domain: DayDomain, widthPx: number): TimeTick[] => {
  const monthPx = (widthPx * daysPerMonth) / (domain.to - domain.from);
  const step = monthSteps.find((months) => months * monthPx >= namePx) ?? 120;
  const start = parseDate(fromDayNumber(Math.ceil(domain.from)));
  const ticks: TimeTick[] = [];
  for (let month = start.year * 12 + start.month - 1; ; month += 1) {
    if (month % step !== 0) continue;
    const [year, index] = [Math.floor(month / 12), month % 12];
    const day = dayNumber(`${year}-${String(index + 1).padStart(2, '0')}-01`);
    if (day > domain.to) return ticks;
    if (day < domain.from) continue;
    ticks.push({ day, month: names[index] ?? '', year: ticks.length === 0 || index === 0 ? year : null });
  }
};
