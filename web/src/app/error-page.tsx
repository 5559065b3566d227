import { usePageTitle } from '../lib/page-title';
import { ErrorNotice } from '../ui/error-notice';
import { PlainPage } from '../ui/plain-page';

/** For what no page caught: a fault of ours, or a part of the app that could not be loaded. */
export const ErrorPage = () => {
  usePageTitle('This page could not be shown');
  return (
    <PlainPage>
      <h1 className="text-title">This page could not be shown</h1>
      <ErrorNotice className="mt-6 max-w-160" onRetry={() => window.location.reload()}>
        Something went wrong while opening it. Nothing saved was lost.
      </ErrorNotice>
    </PlainPage>
  );
};
