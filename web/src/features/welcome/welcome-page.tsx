import { useQuery } from '@tanstack/react-query';
import { useLocation } from 'react-router-dom';
import { translate } from '../../i18n/translate';
import { ApiProblem, describeProblem } from '../../lib/api-problem';
import { usePageTitle } from '../../lib/page-title';
import { ButtonLink } from '../../ui/button';
import { ErrorNotice } from '../../ui/error-notice';
import { PlainPage } from '../../ui/plain-page';
import { SkeletonBar } from '../../ui/skeleton';
import { ChoosePassword } from './choose-password';
import { invitationQuery } from './queries';

interface ClosedLinkProps {
  children: string;
}

const ClosedLink = ({ children }: ClosedLinkProps) => (
  <>
    <h1 className="text-p-title">{translate('welcome.closed')}</h1>
    <p className="mt-2">{children}</p>
    <ButtonLink to="/sign-in" size="patient" className="mt-6">
      {translate('welcome.to-sign-in')}
    </ButtonLink>
  </>
);

/** Where an invitation leads. Staff and patients alike, so it has the patient's size of type. */
export const Component = () => {
  const token = useLocation().hash.slice(1);
  const invitation = useQuery({ ...invitationQuery(token), enabled: token !== '' });
  const unknown = invitation.error instanceof ApiProblem && [404, 409, 410, 422].includes(invitation.error.status);
  usePageTitle(translate('welcome.title', { name: '' }).replace(/,\s*$/, ''));
  return (
    <PlainPage>
      <div className="mx-auto w-full max-w-110 text-p-body">
        {token === '' && <ClosedLink>{translate('welcome.missing')}</ClosedLink>}
        {unknown && <ClosedLink>{translate('welcome.used')}</ClosedLink>}
        {invitation.error && !unknown && (
          <ErrorNotice size="patient" onRetry={() => void invitation.refetch()} retrying={invitation.isFetching}>
            {describeProblem(invitation.error)}
          </ErrorNotice>
        )}
        {invitation.isLoading && (
          <div role="status" aria-label="Loading" className="flex flex-col gap-4">
            <SkeletonBar widthPercent={60} heightPx={28} />
            <SkeletonBar widthPercent={90} />
          </div>
        )}
        {invitation.data && <ChoosePassword token={token} invitation={invitation.data} />}
      </div>
    </PlainPage>
  );
};
