import { Button } from './button';
import { Dialog } from './dialog';
import type { UnsavedWork } from './use-unsaved-work';

interface UnsavedWorkDialogProps {
  work: UnsavedWork;
}

export const UnsavedWorkDialog = ({ work }: UnsavedWorkDialogProps) => (
  <Dialog
    title="Leave without saving?"
    description="What you changed here is not saved yet."
    open={work.asking}
    onClose={work.stay}
    actions={
      <>
        <Button kind="danger" onClick={work.leave}>
          Leave
        </Button>
        <Button kind="main" autoFocus onClick={work.stay}>
          Keep working
        </Button>
      </>
    }
  />
);
