import type { ReactNode } from 'react';
import { Mark } from './mark';
import { SkipLink } from './skip-link';

interface PlainPageProps {
  children: ReactNode;
}

/** A page outside the areas: sign-in, an invitation, a page that does not exist. The line lies flat. */
export const PlainPage = ({ children }: PlainPageProps) => (
  <>
    <SkipLink />
    <header data-top-bar className="h-16 border-b-2 border-tarn bg-mist">
      <div className="page-frame flex h-15 items-center gap-3">
        <Mark width={34} />
        <span className="text-chart">Slighthill</span>
      </div>
    </header>
    <main id="content" tabIndex={-1} className="page-frame py-10">
      {children}
    </main>
  </>
);
