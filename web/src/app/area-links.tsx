import type { Area } from '@slighthill/shared/permissions';
import { Link } from 'react-router-dom';
import { cx } from '../ui/cx';
import { areaPlaces } from './areas';

interface AreaLinksProps {
  areas: readonly Area[];
  current: Area | null;
}

/** The areas on the ridge. The width of a label does not change with its weight, so neighbors stay where they are. */
export const AreaLinks = ({ areas, current }: AreaLinksProps) => (
  <nav aria-label="Areas">
    <ul className="flex gap-8.5">
      {areas.map((area) => (
        <li key={area}>
          <Link
            to={areaPlaces[area].path}
            aria-current={area === current ? 'page' : undefined}
            className={cx(
              'flex min-h-9 items-center rounded-control transition-colors duration-120 hover:text-ink',
              area === current ? 'font-bold text-ink' : 'font-semibold text-ink-soft',
            )}
          >
            <span data-ridge-label>{areaPlaces[area].label}</span>
          </Link>
        </li>
      ))}
    </ul>
  </nav>
);
