import type { ReactNode } from 'react';
import { Icon } from './icon';

interface FormProblemProps {
  /** "Not saved. Your numbers are here." Null keeps the place, so that what appears is announced. */
  children: ReactNode;
}

/** In the foot of a form, where its save button is. */
export const FormProblem = ({ children }: FormProblemProps) => (
  <p role="alert" className="mr-auto flex min-w-0 flex-1 basis-60 items-start gap-2 text-note font-semibold text-rowan">
    {children && (
      <>
        <Icon name="alert" size={18} />
        <span>{children}</span>
      </>
    )}
  </p>
);
