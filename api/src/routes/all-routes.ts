import type { Sessions } from '../auth/session';
import type { Route } from '../http/define-route';
import type { Clock } from '../services/command-context';
import { authRoutes } from './auth.routes';
import { clinicRoutes } from './clinic.routes';
import { draftsRoutes } from './drafts.routes';
import { fileEntriesRoutes } from './file-entries.routes';
import { healthRoutes } from './health.routes';
import { meRoutes } from './me.routes';
import { measurementsRoutes } from './measurements.routes';
import { patientsRoutes } from './patients.routes';
import { spirometryTestsRoutes } from './spirometry-tests.routes';
import { trendsRoutes } from './trends.routes';

/** Every route of the API; the description and the access tests read the same list. */
export function allRoutes(services: { sessions: Sessions; clock: Clock }): Route[] {
  return [
    ...healthRoutes,
    ...authRoutes(services),
    ...clinicRoutes,
    ...patientsRoutes,
    ...spirometryTestsRoutes,
    ...measurementsRoutes,
    ...fileEntriesRoutes,
    ...trendsRoutes,
    ...draftsRoutes,
    ...meRoutes,
  ];
}
