import type { ReactNode } from 'react';
import { SkipLink } from '../ui/skip-link';
import { TopBar } from './top-bar';

interface StaffLayoutProps {
  children: ReactNode;
}

export const StaffLayout = ({ children }: StaffLayoutProps) => (
  <>
    <SkipLink />
    <TopBar />
    <main id="content" tabIndex={-1}>
      {children}
    </main>
  </>
);
