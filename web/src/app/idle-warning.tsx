import { Button } from '../ui/button';

interface IdleWarningProps {
  secondsLeft: number;
  onStay: () => void;
}

/** One minute before the cover. Any touch is an answer too. Marked so that a drawer does not take it for a click outside. */
export const IdleWarning = ({ secondsLeft, onStay }: IdleWarningProps) => (
  <div
    data-session-notice
    role="alert"
    // An open drawer takes the pointer from the whole body.
    style={{ pointerEvents: 'auto' }}
    className="fixed bottom-6 left-1/2 z-60 flex w-[calc(100vw-32px)] max-w-150 -translate-x-1/2 flex-wrap items-center gap-x-4 gap-y-2 rounded-sheet border border-gorse-edge bg-gorse-wash px-5 py-4 shadow-reader"
  >
    <div className="min-w-0 flex-1 basis-60">
      <p className="font-semibold text-gorse-ink">Still there?</p>
      <p className="text-note text-gorse-note">
        This page will be covered within a minute. What you typed stays.
        <span aria-hidden="true"> {secondsLeft} s</span>
      </p>
    </div>
    <Button kind="main" onClick={onStay}>
      Stay signed in
    </Button>
  </div>
);
