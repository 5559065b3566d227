import { usePageTitle } from '../lib/page-title';
import { ButtonLink } from '../ui/button';
import { EmptyState } from '../ui/empty-state';

/** Also for what belongs to another clinic: there is nothing here for this person. */
export const NotFoundPage = () => {
  usePageTitle('Not found');
  return (
    <div className="page-frame py-8">
      <h1 className="text-title">Nothing at this address</h1>
      <EmptyState
        action={
          <ButtonLink kind="second" to="/">
            Go to your first page
          </ButtonLink>
        }
      >
        It may have moved, or it is not yours to see.
      </EmptyState>
    </div>
  );
};
