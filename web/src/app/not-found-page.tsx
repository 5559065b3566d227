import { translate } from '../i18n/translate';
import { usePageTitle } from '../lib/page-title';
import { useSessionUser } from '../lib/session';
import { ButtonLink } from '../ui/button';
import { EmptyState } from '../ui/empty-state';

/** Also for what belongs to another clinic: there is nothing here for this person. */
export const NotFoundPage = () => {
  usePageTitle(translate('error.not-found'));
  const isPatient = useSessionUser().patientId !== null;
  return (
    // A patient's pages stand in a narrow column that has its own sides.
    <div className={isPatient ? 'py-4' : 'page-frame py-8'}>
      <h1 className={isPatient ? 'text-p-title' : 'text-title'}>{translate('error.not-found')}</h1>
      <EmptyState
        action={
          <ButtonLink kind="second" size={isPatient ? 'patient' : 'staff'} to="/">
            {translate('error.not-found.go')}
          </ButtonLink>
        }
      >
        {translate('error.not-found.why')}
      </EmptyState>
    </div>
  );
};
