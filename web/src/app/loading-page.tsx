import { PlainPage } from '../ui/plain-page';
import { VisuallyHidden } from '../ui/visually-hidden';

export const LoadingPage = () => (
  <PlainPage>
    <div role="status">
      <VisuallyHidden>Loading</VisuallyHidden>
      <div aria-hidden="true" className="flex flex-col gap-4">
        <span className="h-7 w-60 max-w-full rounded-tag bg-row" />
        <span className="h-4 w-96 max-w-full rounded-tag bg-row" />
      </div>
    </div>
  </PlainPage>
);
