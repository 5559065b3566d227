import { markShape, ridgePath } from './ridge-path';

interface MarkProps {
  width?: number;
}

const path = ridgePath(markShape).replace(/^M0 /, 'M2 ');

/** The logo mark: one hill. The name beside it is text. */
export const Mark = ({ width = 40 }: MarkProps) => (
  <svg aria-hidden="true" viewBox="0 0 40 19" width={width} height={(width * 19) / 40} className="shrink-0">
    <path d={path} fill="none" stroke="var(--tarn)" strokeWidth={3} strokeLinecap="round" strokeLinejoin="round" />
  </svg>
);
