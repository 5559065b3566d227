import { useId, type ReactNode } from 'react';
import type { Patient } from '@slighthill/shared/contracts/patient';
import { Button } from '../../../ui/button';
import { Drawer } from '../../../ui/drawer';
import { patientWords } from '../patient-words';
import type { RecordDrawerState } from './use-record-drawer';
import { WorkStatus } from './work-status';

interface RecordFrameProps {
  title: string;
  patient: Patient;
  drawer: RecordDrawerState;
  openQuestions: number;
  saveLabel: string;
  keepsDraft: boolean;
  /** Offered while a restored draft is on the screen. */
  onStartOver?: (() => void) | undefined;
  onClose: () => void;
  /** Closed with a draft, kept at this instant. */
  onKept?: ((at: string) => void) | undefined;
  /** A further button before Save. */
  extra?: ReactNode;
  children: ReactNode;
}

/** Head, foot and the form between them. Save is never grayed out: it goes to what is open. */
export const RecordFrame = ({
  title,
  patient,
  drawer,
  openQuestions,
  saveLabel,
  keepsDraft,
  onStartOver,
  onClose,
  onKept,
  extra,
  children,
}: RecordFrameProps) => {
  const formId = useId();
  const { draft, work } = drawer;
  const startOver = async (): Promise<void> => {
    await draft.discard();
    work.release();
    onStartOver?.();
  };
  const keep = async (): Promise<void> => {
    const { mayClose, keptAt } = await drawer.keep();
    if (!mayClose) return;
    onClose();
    if (keptAt !== null) onKept?.(keptAt);
  };
  return (
    <Drawer
      title={title}
      subtitle={patientWords(patient)}
      work={work}
      onClose={onClose}
      foot={
        <>
          <WorkStatus problem={drawer.problem} draft={draft.state} openQuestions={openQuestions} />
          {keepsDraft && <Button onClick={() => void keep()}>Keep as draft</Button>}
          {extra}
          <Button kind="main" type="submit" form={formId} saving={drawer.saving}>
            {saveLabel}
          </Button>
        </>
      }
    >
      <form id={formId} noValidate onSubmit={drawer.submit} className="flex flex-col gap-4">
        {onStartOver && (
          <p className="flex flex-wrap items-center justify-between gap-2 rounded-control bg-mist px-4 py-2">
            This is your kept draft.
            <Button kind="quiet" size="row" onClick={() => void startOver()}>
              Start over
            </Button>
          </p>
        )}
        {children}
      </form>
    </Drawer>
  );
};
