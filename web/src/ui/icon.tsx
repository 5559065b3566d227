import type { ReactNode } from 'react';
import { cx } from './cx';

/** Drawn on a 20 px square with a 1.6 px round stroke in one color; always beside a word. */
const drawings = {
  alert: (
    <>
      <path d="M10 3.2 17.3 16H2.7Z" />
      <path d="M10 8.2v3.6M10 13.9v.1" />
    </>
  ),
  pen: <path d="M12.9 3.9 15.6 6.6 6.6 15.6 3.4 16.2 4 13Zm-2 2 2.7 2.7M10.5 16.6h6" />,
  dollar: (
    <>
      <circle cx="10" cy="10" r="7.2" />
      <path d="M12.3 7.7c-.4-.8-1.2-1.2-2.3-1.2-1.3 0-2.2.6-2.2 1.7 0 2.5 4.6 1.1 4.6 3.6 0 1.1-1 1.7-2.4 1.7-1.2 0-2.1-.5-2.5-1.3M10 5.2v9.6" />
    </>
  ),
  document: <path d="M5 2.8h6.5L15.2 6.5v10.7H5Zm6.3.2v3.7H15M7.6 10h5M7.6 13h5" />,
  check: <path d="m4 10.6 3.9 4L16 5.8" />,
  clock: (
    <>
      <circle cx="10" cy="10" r="7.2" />
      <path d="M10 5.8V10l2.9 1.9" />
    </>
  ),
  plus: <path d="M10 3.8v12.4M3.8 10h12.4" />,
  close: <path d="m4.6 4.6 10.8 10.8M15.4 4.6 4.6 15.4" />,
  search: (
    <>
      <circle cx="8.7" cy="8.7" r="5.3" />
      <path d="m12.7 12.7 4.1 4.1" />
    </>
  ),
  table: <path d="M3 4h14v12H3Zm0 4.2h14M8 8.2V16" />,
  rising: <path d="M2.8 15.2c4.4 0 4.8-1.8 6.7-5.2 1.5-2.7 3.1-3.6 7.2-3.6m-3-3 3.2 3-3.2 3" />,
  falling: <path d="M2.8 5c4.4 0 4.8 1.8 6.7 5.2 1.5 2.7 3.1 3.6 7.2 3.6m-3 3 3.2-3-3.2-3" />,
  flat: <path d="M4 10h12" />,
  people: (
    <>
      <circle cx="7.5" cy="6.6" r="2.8" />
      <path d="M2.4 16.4c0-3 2.2-4.9 5.1-4.9s5.1 1.9 5.1 4.9M12.9 4c1.5.2 2.5 1.3 2.5 2.7s-1 2.4-2.3 2.7M14.7 11.9c1.8.6 2.9 2.2 2.9 4.5" />
    </>
  ),
  person: (
    <>
      <circle cx="10" cy="6.6" r="3" />
      <path d="M4.2 16.6c0-3.2 2.5-5.2 5.8-5.2s5.8 2 5.8 5.2" />
    </>
  ),
  phone: (
    <path d="M4 3.2h3l1.5 3.9-1.9 1.4c.9 2 2.5 3.6 4.8 4.8l1.5-1.8 3.9 1.5v2.9c-.6.8-1.5 1.1-2.6 1C8.5 16 4 11.6 3.2 5.8c-.1-1.1.2-2 .8-2.6Z" />
  ),
  home: <path d="M3 9.6 10 3.2l7 6.4M4.8 8.2v8.4h3.7v-4.8h3v4.8h3.7V8.2" />,
  bars: <path d="M2.8 16.6h14.4M5.6 16.4v-4M10 16.4V7.6M14.4 16.4V3.6" />,
  calendar: <path d="M3.4 4.8h13.2v11.8H3.4Zm0 3.9h13.2M6.9 3v3.2M13.1 3v3.2" />,
  note: <path d="M4.6 3h10.8v14H4.6ZM7.6 7h4.8M7.6 10.2h4.8" />,
  card: <path d="M2.8 4.6h14.4v10.8H2.8Zm0 3.7h14.4M5.6 12.4h2.8" />,
  mail: <path d="M2.8 4.6h14.4v10.8H2.8Zm.3.5L10 10.6l6.9-5.5" />,
  previous: <path d="M12.2 4.6 6.8 10l5.4 5.4" />,
  next: <path d="M7.8 4.6 13.2 10l-5.4 5.4" />,
  down: <path d="M4.6 7.6 10 13l5.4-5.4" />,
  up: <path d="M4.6 12.4 10 7l5.4 5.4" />,
  lock: (
    <>
      <path d="M4.6 9h10.8v7.6H4.6ZM6.8 9V6.6C6.8 4.7 8.1 3.4 10 3.4s3.2 1.3 3.2 3.2V9" />
    </>
  ),
  settings: <path d="M3 6h7.4M14.6 6H17M3 14h2.4M9.6 14H17M12.5 4v4M7.5 12v4" />,
  copy: <path d="M7 7h9.4v9.4H7ZM13 7V3.6H3.6V13H7" />,
} satisfies Record<string, ReactNode>;

export type IconName = keyof typeof drawings;

interface IconProps {
  name: IconName;
  size?: number;
  className?: string;
}

export const Icon = ({ name, size = 20, className }: IconProps) => (
  <svg
    aria-hidden="true"
    viewBox="0 0 20 20"
    width={size}
    height={size}
    fill="none"
    stroke="currentColor"
    strokeWidth={1.6}
    strokeLinecap="round"
    strokeLinejoin="round"
    className={cx('shrink-0', className)}
  >
    {drawings[name]}
  </svg>
);
