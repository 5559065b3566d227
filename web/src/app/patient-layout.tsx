import { useRef, type ReactNode } from 'react';
import { Link, useLocation } from 'react-router-dom';
import { translate } from '../i18n/translate';
import { useSessionUser, useSignOut } from '../lib/session';
import { useMediaQuery } from '../lib/use-media-query';
import { Button } from '../ui/button';
import { Icon } from '../ui/icon';
import { Mark } from '../ui/mark';
import { Ridge } from '../ui/ridge';
import { ridgeShape } from '../ui/ridge-path';
import { SkipLink } from '../ui/skip-link';
import { useAnimatedRidge } from '../ui/use-animated-ridge';
import { AreaLinks } from './area-links';
import { currentArea } from './areas';
import { BottomBar } from './bottom-bar';
import { useRidgeLabel } from './use-ridge-label';

const CallUs = () => {
  const { clinic } = useSessionUser();
  if (clinic.phone === null) return null;
  return (
    <a
      href={`tel:${clinic.phone.replace(/[^+\d]/g, '')}`}
      className="link flex min-h-12 shrink-0 items-center gap-2 text-p-label whitespace-nowrap"
    >
      <Icon name="phone" size={22} />
      {translate('home.call-us')}
    </a>
  );
};

/** On a desk the areas stand on the ridge; on a phone they are at the bottom, under the thumb. */
const DeskBar = () => {
  const bar = useRef<HTMLDivElement>(null);
  const { areas, clinic } = useSessionUser();
  const area = currentArea(useLocation().pathname, areas);
  const measured = useRidgeLabel(bar, `${area} ${areas.join()}`);
  const shape = useAnimatedRidge(measured && ridgeShape({ ...measured, base: 61, rise: 15 }), String(area));
  return (
    <header ref={bar} data-top-bar className="relative h-16 overflow-hidden bg-mist">
      {shape && <Ridge shape={shape} height={64} ground="paper" />}
      <div className="page-frame relative flex h-full items-center gap-12 pb-2">
        <Link to="/" className="flex items-center gap-3 rounded-control text-chart">
          <Mark width={34} />
          {clinic.name}
        </Link>
        <AreaLinks areas={areas} current={area} />
        <div className="ml-auto">
          <CallUs />
        </div>
      </div>
    </header>
  );
};

const PhoneHeader = () => {
  const { clinic } = useSessionUser();
  return (
    <header data-top-bar className="flex items-center justify-between gap-4 px-5 pt-3">
      <Link to="/" className="flex min-h-12 items-center gap-3 rounded-control text-p-label font-bold">
        <Mark width={34} />
        {clinic.name}
      </Link>
      <CallUs />
    </header>
  );
};

interface PatientLayoutProps {
  children: ReactNode;
}

export const PatientLayout = ({ children }: PatientLayoutProps) => {
  const desk = useMediaQuery('(min-width: 40rem)');
  const signOut = useSignOut();
  return (
    <div className="flex min-h-dvh flex-col text-p-body">
      <SkipLink />
      {desk ? <DeskBar /> : <PhoneHeader />}
      <main id="content" tabIndex={-1} className="mx-auto w-full max-w-150 flex-1 px-5 py-5">
        {children}
        <div className="mt-6 flex justify-center" data-print="hide">
          <Button kind="quiet" size="patient" onClick={() => void signOut()}>
            {translate('account.sign-out')}
          </Button>
        </div>
      </main>
      {!desk && <BottomBar />}
    </div>
  );
};
