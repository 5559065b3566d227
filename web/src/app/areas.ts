import type { Area } from '@slighthill/shared/permissions';
import type { IconName } from '../ui/icon';

interface AreaPlace {
  label: string;
  path: string;
  icon: IconName;
}

/** Every area that has a screen, with its name on the ridge and where it begins. */
export const areaPlaces: Record<Area, AreaPlace> = {
  patients: { label: 'Patients', path: '/patients', icon: 'people' },
  clinic: { label: 'Clinic', path: '/clinic', icon: 'settings' },
  home: { label: 'Home', path: '/home', icon: 'home' },
};

export const currentArea = (pathname: string, areas: readonly Area[]): Area | null =>
  areas.find((area) => pathname === areaPlaces[area].path || pathname.startsWith(`${areaPlaces[area].path}/`)) ?? null;
