import { useRef } from 'react';
import { Link, useLocation } from 'react-router-dom';
import { formatClock } from '../lib/clinic-time';
import { useSessionUser, useSignOut } from '../lib/session';
import { useMediaQuery } from '../lib/use-media-query';
import { useMinute } from '../lib/use-minute';
import { Icon } from '../ui/icon';
import { Mark } from '../ui/mark';
import { Menu } from '../ui/menu';
import { Ridge } from '../ui/ridge';
import { ridgeShape } from '../ui/ridge-path';
import { useAnimatedRidge } from '../ui/use-animated-ridge';
import { currentArea } from './areas';
import { AreaLinks } from './area-links';
import { useRidgeLabel } from './use-ridge-label';

const ClinicClock = () => {
  const { clinic } = useSessionUser();
  const now = useMinute();
  return (
    <time dateTime={now.toISOString()} title={`${clinic.name}, ${clinic.timeZone}`} className="whitespace-nowrap">
      {formatClock(now, clinic.timeZone)}
    </time>
  );
};

const PersonMenu = () => {
  const user = useSessionUser();
  const signOut = useSignOut();
  return (
    <Menu
      heading={
        <>
          <p className="font-semibold">{user.displayName}</p>
          <p className="text-note text-ink-soft">{user.clinic.name}</p>
        </>
      }
      items={[{ label: 'Sign out', icon: 'lock', onSelect: () => void signOut() }]}
      trigger={
        <button type="button" className="inline-flex min-h-9 items-center gap-2 rounded-control whitespace-nowrap">
          <span className="font-semibold">{user.displayName}</span>
          <span className="hidden text-ink-soft margin:inline">{user.title}</span>
          <Icon name="down" size={16} />
        </button>
      }
    />
  );
};

interface RidgedProps {
  narrow: boolean;
}

/** One line where it fits; below 900 the areas get a line of their own that scrolls sideways with its ridge. */
const useStaffRidge = ({ narrow }: RidgedProps) => {
  const bar = useRef<HTMLDivElement>(null);
  const user = useSessionUser();
  const { pathname } = useLocation();
  const area = currentArea(pathname, user.areas);
  const measured = useRidgeLabel(bar, `${area} ${user.areas.join()} ${narrow}`);
  const target = measured && ridgeShape({ ...measured, base: narrow ? 49 : 61, rise: 15 });
  const shape = useAnimatedRidge(target, String(area));
  return { bar, shape, areas: user.areas, area };
};

const Brand = () => (
  <Link to="/" className="flex min-h-9 items-center gap-3 rounded-control margin:w-38">
    <Mark width={34} />
    <span className="text-chart">Slighthill</span>
  </Link>
);

const WideBar = () => {
  const { bar, shape, areas, area } = useStaffRidge({ narrow: false });
  return (
    <div ref={bar} className="relative h-16 overflow-hidden">
      {shape && <Ridge shape={shape} height={64} ground="paper" />}
      <div className="page-frame relative flex h-full items-center gap-6 pb-2 margin:gap-0">
        <Brand />
        <AreaLinks areas={areas} current={area} />
        <div className="ml-auto flex items-center gap-5">
          <ClinicClock />
          <span aria-hidden="true" className="h-6 w-px bg-rule" />
          <PersonMenu />
        </div>
      </div>
    </div>
  );
};

const NarrowBar = () => {
  const { bar, shape, areas, area } = useStaffRidge({ narrow: true });
  return (
    <>
      <div className="page-frame flex h-12 items-center justify-between gap-4">
        <Brand />
        <PersonMenu />
      </div>
      <div ref={bar} className="relative h-13 overflow-x-auto overflow-y-hidden">
        {shape && <Ridge shape={shape} height={52} ground="paper" />}
        <div className="relative flex h-full w-max items-center px-5 pb-3 row:px-8">
          <AreaLinks areas={areas} current={area} />
        </div>
      </div>
    </>
  );
};

export const TopBar = () => {
  const wide = useMediaQuery('(min-width: 56.25rem)');
  return (
    <header data-top-bar className="sticky top-0 z-30 bg-mist">
      {wide ? <WideBar /> : <NarrowBar />}
    </header>
  );
};
