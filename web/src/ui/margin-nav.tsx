import { Link, useLocation } from 'react-router-dom';
import { cx } from './cx';

export interface MarginNavItem {
  to: string;
  label: string;
  count?: number;
  /** Set where the address's path alone does not say it. */
  current?: boolean;
}

interface MarginNavProps {
  /** Spoken name of this navigation. */
  label: string;
  items: readonly MarginNavItem[];
  /** Sticky top, when something more than the top bar stands above. */
  stickyTop?: string;
}

/** The sections of a page in its margin; one line above the content where there is no margin. */
export const MarginNav = ({ label, items, stickyTop = 'calc(var(--top-bar-height) + 16px)' }: MarginNavProps) => {
  const { pathname } = useLocation();
  const isCurrent = (item: MarginNavItem): boolean =>
    item.current ?? (pathname === item.to || pathname.startsWith(`${item.to}/`));
  return (
    <nav aria-label={label} className="margin:sticky" style={{ top: stickyTop }} data-print="hide">
      <ul className="-mx-3.5 flex gap-1 overflow-x-auto p-1 margin:m-0 margin:-ml-3.5 margin:flex-col margin:p-0">
        {items.map((item) => (
          <li key={item.to}>
            <Link
              to={item.to}
              aria-current={isCurrent(item) ? 'page' : undefined}
              className={cx(
                'flex min-h-9 items-center justify-between gap-3 border-b-3 px-2.5 whitespace-nowrap transition-colors duration-120 hover:text-ink margin:border-b-0 margin:border-l-3',
                isCurrent(item) ? 'border-tarn font-bold text-ink' : 'border-transparent text-ink-soft',
              )}
            >
              {item.label}
              {item.count !== undefined && <span className="text-note font-normal text-ink-soft">{item.count}</span>}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
};
