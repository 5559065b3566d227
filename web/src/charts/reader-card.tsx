import type { PointDescription } from './describe-point';

interface ReaderCardProps {
  description: PointDescription;
}

/** The full point under the reader. Its words are announced elsewhere, so this is for the eye. */
export const ReaderCard = ({ description: { date, role, figures, details } }: ReaderCardProps) => (
  <div aria-hidden="true" className="rounded-sheet border border-line bg-surface px-3.5 py-2.5 shadow-reader">
    <p className="flex items-baseline justify-between gap-3">
      <span className="text-body font-bold">{date}</span>
      {role && <span className="text-note font-semibold text-tarn">{role}</span>}
    </p>
    <div className="mt-1 flex gap-x-6">
      {figures.map(({ value, label }) => (
        <div key={label} className="min-w-0">
          <p className="text-chart whitespace-nowrap">{value}</p>
          <p className="text-note text-ink-soft">{label}</p>
        </div>
      ))}
    </div>
    {details !== '' && <p className="mt-1.5 border-t border-row pt-1.5 text-note text-ink-soft">{details}</p>}
  </div>
);

/** About how high the card will be: it is placed before it is drawn. */
export const cardHeightPx = ({ details, figures }: PointDescription): number => {
  const lines = Math.ceil(details.length / 38);
  const labelLines = figures.some(({ label }) => label.length > 12) ? 2 : 1;
  return 72 + labelLines * 18 + (lines === 0 ? 0 : 13 + lines * 18);
};
