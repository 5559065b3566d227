import { VisuallyHidden } from './visually-hidden';

interface SkeletonRowsProps {
  /** What is being loaded, spoken: "Loading patients". */
  label: string;
  rows?: number;
  /** Share of the row each bar takes, in percent. */
  bars?: readonly number[];
}

/** Bars in the shape of the rows to come; they do not move. */
export const SkeletonRows = ({ label, rows = 6, bars = [22, 12, 16, 18] }: SkeletonRowsProps) => (
  <div role="status" data-skeleton>
    <VisuallyHidden>{label}</VisuallyHidden>
    <div aria-hidden="true">
      {Array.from({ length: rows }, (_, row) => (
        <div key={row} className="flex h-11 items-center gap-6 border-b border-row">
          {bars.map((share, bar) => (
            <SkeletonBar key={bar} widthPercent={share - ((row * 3 + bar) % 4)} />
          ))}
        </div>
      ))}
    </div>
  </div>
);

interface SkeletonBarProps {
  widthPercent: number;
  heightPx?: number;
}

export const SkeletonBar = ({ widthPercent, heightPx = 14 }: SkeletonBarProps) => (
  <span className="block rounded-tag bg-row" style={{ width: `${widthPercent}%`, height: heightPx }} />
);
