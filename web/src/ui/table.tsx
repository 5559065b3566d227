import type { HTMLAttributes, ReactNode, TdHTMLAttributes, ThHTMLAttributes } from 'react';
import { cx } from './cx';
import { VisuallyHidden } from './visually-hidden';

interface TableProps {
  /** What the table lists; spoken, not drawn. */
  caption: string;
  busy?: boolean;
  className?: string;
  children: ReactNode;
}

/** Real headers; below 640 the rows become stacks and each cell carries its header's words. */
export const Table = ({ caption, busy, className, children }: TableProps) => (
  <table aria-busy={busy} className={cx('w-full border-collapse text-left max-row:block', className)}>
    <VisuallyHidden as="caption">{caption}</VisuallyHidden>
    {children}
  </table>
);

export const TableHead = ({ children }: { children: ReactNode }) => (
  <thead className="max-row:sr-only">
    <tr>{children}</tr>
  </thead>
);

interface HeaderCellProps extends ThHTMLAttributes<HTMLTableCellElement> {
  numeric?: boolean;
  /** Stays under the top bar while its page scrolls; not inside a drawer, which scrolls by itself. */
  sticky?: boolean;
}

export const HeaderCell = ({ numeric = false, sticky = true, className, ...rest }: HeaderCellProps) => (
  <th
    scope="col"
    {...rest}
    className={cx(
      'border-b border-rule py-2 pr-4 text-head whitespace-nowrap text-ink-soft last:pr-0',
      sticky && 'sticky top-(--top-bar-height) z-10 bg-paper',
      numeric && 'text-right',
      className,
    )}
  />
);

export const TableBody = ({ children }: { children: ReactNode }) => <tbody className="max-row:block">{children}</tbody>;

export const Row = ({ className, ...rest }: HTMLAttributes<HTMLTableRowElement>) => (
  <tr {...rest} className={cx('border-b border-row max-row:block max-row:py-3', className)} />
);

interface CellProps extends TdHTMLAttributes<HTMLTableCellElement> {
  /** The header's words, shown before the value when rows are stacked. */
  label?: string;
  numeric?: boolean;
  /** The cell that names its row. */
  asHeader?: boolean;
}

export const Cell = ({ label, numeric = false, asHeader = false, className, children, ...rest }: CellProps) => {
  const Tag = asHeader ? 'th' : 'td';
  return (
    <Tag
      {...rest}
      {...(asHeader ? { scope: 'row' } : {})}
      className={cx(
        'py-2.5 pr-4 align-baseline font-normal last:pr-0 max-row:flex max-row:items-baseline max-row:gap-3 max-row:py-0.5 max-row:pr-0 max-row:text-left',
        numeric && 'text-right',
        className,
      )}
    >
      {label && (
        <span aria-hidden="true" className="hidden w-28 shrink-0 text-note text-ink-soft max-row:inline">
          {label}
        </span>
      )}
      <div className="max-row:min-w-0 max-row:flex-1">{children}</div>
    </Tag>
  );
};
