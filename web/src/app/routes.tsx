import { Navigate, type RouteObject } from 'react-router-dom';
import { ErrorPage } from './error-page';
import { LoadingPage } from './loading-page';
import { NotFoundPage } from './not-found-page';
import { overPage } from './use-heading-focus';

const clinicSections: RouteObject[] = [
  { index: true, element: <Navigate to="users" replace /> },
  { path: 'users', lazy: () => import('../features/clinic/users-page') },
  { path: 'programs', lazy: () => import('../features/clinic/programs-page') },
  { path: 'rules', lazy: () => import('../features/clinic/rules-page') },
  { path: 'audit', lazy: () => import('../features/clinic/audit-page') },
];

const recordSections: RouteObject[] = [
  { index: true, element: <Navigate to="summary" replace /> },
  { path: 'summary', lazy: () => import('../features/record/summary-page') },
  { path: 'tests', lazy: () => import('../features/recording/tests-page') },
  { path: 'tests/:kind/:testId', lazy: () => import('../features/recording/test-detail-page') },
  { path: 'file', lazy: () => import('../features/recording/file-page') },
  { path: 'details', lazy: () => import('../features/record/details-page') },
];

const signedInRoutes: RouteObject[] = [
  { index: true, lazy: () => import('./first-page') },
  {
    path: 'patients',
    lazy: () => import('../features/patients/patients-page'),
    children: [{ path: 'new', handle: overPage, lazy: () => import('../features/patients/new-patient-drawer') }],
  },
  { path: 'patients/:patientId', lazy: () => import('./record-route'), children: recordSections },
  { path: 'clinic', lazy: () => import('../features/clinic/clinic-page'), children: clinicSections },
  { path: 'home', lazy: () => import('../features/home/home-page') },
  { path: '*', element: <NotFoundPage /> },
];

/** Every address of the web. Pages load on demand; only the router itself comes with the first load. */
export const routes: RouteObject[] = [
  {
    ErrorBoundary: ErrorPage,
    HydrateFallback: LoadingPage,
    children: [
      { path: '/sign-in', lazy: () => import('../features/sign-in/sign-in-page') },
      { path: '/welcome', lazy: () => import('../features/welcome/welcome-page') },
      { path: '/', lazy: () => import('./auth-gate'), children: signedInRoutes },
    ],
  },
];
