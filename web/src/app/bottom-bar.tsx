import { useRef } from 'react';
import { Link, useLocation } from 'react-router-dom';
import { useSessionUser } from '../lib/session';
import { cx } from '../ui/cx';
import { Icon } from '../ui/icon';
import { Ridge } from '../ui/ridge';
import { bottomRidgeShape } from '../ui/ridge-path';
import { useAnimatedRidge } from '../ui/use-animated-ridge';
import { areaPlaces, currentArea } from './areas';
import { useRidgeLabel } from './use-ridge-label';

/** The phone's bar: the same line on its upper edge, mist below it, one target of at least 48 px per area. */
export const BottomBar = () => {
  const bar = useRef<HTMLElement>(null);
  const { areas } = useSessionUser();
  const current = currentArea(useLocation().pathname, areas);
  const measured = useRidgeLabel(bar, `${current} ${areas.join()}`);
  const shape = useAnimatedRidge(measured && bottomRidgeShape({ ...measured, base: 16, rise: 12 }), String(current));
  return (
    <nav ref={bar} aria-label="Areas" data-print="hide" className="sticky bottom-0 h-23 overflow-hidden pt-4">
      {shape && <Ridge shape={shape} height={92} strokeWidth={2} ground="mist" />}
      <ul className="relative flex justify-around">
        {areas.map((area) => (
          <li key={area} className="flex max-w-30 flex-1 justify-center">
            <Link
              to={areaPlaces[area].path}
              aria-current={area === current ? 'page' : undefined}
              className={cx(
                'flex min-h-14 min-w-16 flex-col items-center justify-center gap-1 rounded-control text-p-bar',
                area === current ? 'font-bold text-tarn-deep' : 'text-ink-soft',
              )}
            >
              <Icon name={areaPlaces[area].icon} size={22} />
              <span data-ridge-label>{areaPlaces[area].label}</span>
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
};
