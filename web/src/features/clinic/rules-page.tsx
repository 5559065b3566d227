import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { describeProblem } from '../../lib/api-problem';
import { usePageTitle } from '../../lib/page-title';
import { ErrorNotice } from '../../ui/error-notice';
import { PageHeader } from '../../ui/page-header';
import { SkeletonRows } from '../../ui/skeleton';
import { clinicQuery } from './queries';
import { RulesForm } from './rules-form';

export const Component = () => {
  usePageTitle('Rules');
  const query = useQuery(clinicQuery);
  const [saved, setSaved] = useState<string | null>(null);
  return (
    <>
      <PageHeader title="Rules" note="How this clinic reads its tests" />
      <div className="mt-4 max-w-160">
        {query.isPending && <SkeletonRows label="Loading rules" rows={5} bars={[30, 40]} />}
        {query.error && !query.data && (
          <ErrorNotice onRetry={() => void query.refetch()} retrying={query.isFetching}>
            {`The rules could not be loaded. ${describeProblem(query.error)}`}
          </ErrorNotice>
        )}
        {query.data && (
          <RulesForm
            key={query.data.version}
            clinic={query.data}
            saved={saved}
            onSaved={() => setSaved('Saved. Grades shown from now on follow these rules.')}
          />
        )}
      </div>
    </>
  );
};
