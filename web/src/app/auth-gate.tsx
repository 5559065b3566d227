import { useQuery } from '@tanstack/react-query';
import { lazy, Suspense } from 'react';
import { Navigate, Outlet, useLocation } from 'react-router-dom';
import { ApiProblem, describeProblem } from '../lib/api-problem';
import { meQuery, SessionContext } from '../lib/session';
import { ErrorNotice } from '../ui/error-notice';
import { PlainPage } from '../ui/plain-page';
import { currentArea } from './areas';
import { LoadingPage } from './loading-page';
import { NotFoundPage } from './not-found-page';
import { SessionGuard } from './session-guard';
import { useHeadingFocus } from './use-heading-focus';

const StaffLayout = lazy(() => import('./staff-layout').then((module) => ({ default: module.StaffLayout })));
const PatientLayout = lazy(() => import('./patient-layout').then((module) => ({ default: module.PatientLayout })));

/** Everything behind the sign-in: who is here, the layout that fits, and the areas that person has. */
export const Component = () => {
  const location = useLocation();
  const me = useQuery(meQuery);
  useHeadingFocus();

  if (me.data) {
    const Layout = me.data.patientId === null ? StaffLayout : PatientLayout;
    const known = location.pathname === '/' || currentArea(location.pathname, me.data.areas) !== null;
    return (
      <SessionContext value={me.data}>
        <SessionGuard user={me.data}>
          <Suspense fallback={<LoadingPage />}>
            <Layout>{known ? <Outlet /> : <NotFoundPage />}</Layout>
          </Suspense>
        </SessionGuard>
      </SessionContext>
    );
  }
  if (me.error instanceof ApiProblem && me.error.isSignedOut) {
    const next = `${location.pathname}${location.search}`;
    return <Navigate to={next === '/' ? '/sign-in' : `/sign-in?next=${encodeURIComponent(next)}`} replace />;
  }
  if (me.error) {
    return (
      <PlainPage>
        <h1 className="text-title">Slighthill is out of reach</h1>
        <ErrorNotice className="mt-6 max-w-160" onRetry={() => void me.refetch()} retrying={me.isFetching}>
          {describeProblem(me.error)}
        </ErrorNotice>
      </PlainPage>
    );
  }
  return <LoadingPage />;
};
