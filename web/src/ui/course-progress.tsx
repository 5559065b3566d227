import { cx } from './cx';

export type SessionMark = 'attended' | 'missed' | 'to-come';

interface CourseProgressProps {
  marks: readonly SessionMark[];
  perWeek: number;
  /** Always with its words: "Session 9 of 24". */
  words: string;
  size?: 'staff' | 'patient';
}

const looks: Record<SessionMark, string> = {
  attended: 'border-tarn bg-tarn',
  missed: 'border-tarn bg-surface',
  'to-come': 'border-edge bg-mist',
};

/** One short stroke per planned session, a small gap every week. */
export const CourseProgress = ({ marks, perWeek, words, size = 'staff' }: CourseProgressProps) => (
  <div className={cx('flex gap-x-3 gap-y-2', size === 'staff' ? 'flex-wrap items-center' : 'flex-col')}>
    <span className={size === 'staff' ? 'whitespace-nowrap' : 'text-p-body'}>{words}</span>
    <span aria-hidden="true" className={cx('flex', size === 'staff' ? 'h-4.5 gap-0.5' : 'h-8 gap-1')}>
      {marks.map((mark, index) => (
        <span
          key={index}
          className={cx(
            'rounded-chip border',
            size === 'staff' ? 'w-1.25' : 'min-w-1 flex-1',
            looks[mark],
            index > 0 && index % perWeek === 0 && (size === 'staff' ? 'ml-1' : 'ml-2'),
          )}
        />
      ))}
    </span>
  </div>
);
