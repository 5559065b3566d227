import type { FileEntry } from '@slighthill/shared/contracts/file-entry';
import type { Patient } from '@slighthill/shared/contracts/patient';
import { useId, useRef, useState } from 'react';
import { formatDate, formatInstant } from '../../../lib/clinic-time';
import { useClinicZone } from '../../../lib/session';
import { Badge } from '../../../ui/badge';
import { Button } from '../../../ui/button';
import { FileDetail } from './file-detail';
import { fileEntryWords } from './file-words';
import { ReleaseDialog } from './release-dialog';

interface FileRowProps {
  patient: Patient;
  entry: FileEntry;
  /** Someone changed the entry since the list was got. */
  onStale: () => void;
}

const HoldState = ({ entry }: { entry: FileEntry }) => {
  const timeZone = useClinicZone();
  if (entry.kind !== 'safety-hold' || entry.voided) return null;
  if (!entry.released)
    return (
      <Badge tone="danger" icon="alert">
        On hold
      </Badge>
    );
  return (
    <span className="text-note text-fern">
      {`Released ${formatInstant(entry.released.at, timeZone)} by ${entry.released.by.displayName}: ${entry.released.reason}`}
    </span>
  );
};

/** One entry in a line; its history and what may be done with it open below. */
export const FileRow = ({ patient, entry, onStale }: FileRowProps) => {
  const id = useId();
  const [open, setOpen] = useState(false);
  const [releasing, setReleasing] = useState(false);
  const history = useRef<HTMLButtonElement>(null);
  const onHold = entry.kind === 'safety-hold' && !entry.released && !entry.voided;
  const mayRelease = patient.abilities.includes('release-hold') && onHold;
  // The button that opened the dialog is gone with the hold: the focus stays on the row, on what it still offers.
  const focusRow = (): void => void window.setTimeout(() => history.current?.focus());
  const words = fileEntryWords(entry);
  return (
    <li className="border-b border-row py-2.5 first:border-t first:border-t-rule">
      <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1">
        <span className="w-28 shrink-0 text-ink-soft">{formatDate(entry.on)}</span>
        <span className="flex min-w-0 flex-1 basis-60 flex-wrap items-center gap-x-3 gap-y-1">
          {entry.voided ? <del className="text-ink-soft">{words}</del> : <span>{words}</span>}
          {entry.voided && <Badge tone="danger">Voided</Badge>}
          {entry.version > 1 && !entry.voided && !entry.released && <Badge>Amended</Badge>}
          <HoldState entry={entry} />
          {entry.note && <span className="basis-full text-note text-ink-soft">{entry.note}</span>}
        </span>
        <span className="text-note text-ink-soft">{entry.recordedBy.displayName}</span>
        {mayRelease && (
          <Button size="row" aria-label={`Release ${words}`} onClick={() => setReleasing(true)}>
            Release
          </Button>
        )}
        <Button
          ref={history}
          kind="quiet"
          size="row"
          aria-expanded={open}
          aria-controls={id}
          aria-label={`History of ${words}`}
          onClick={() => setOpen(!open)}
        >
          {open ? 'Close' : 'History'}
        </Button>
      </div>
      <div id={id} hidden={!open}>
        {open && <FileDetail patient={patient} entryId={entry.id} />}
      </div>
      {releasing && (
        <ReleaseDialog
          entry={entry}
          onClose={() => setReleasing(false)}
          onReleased={() => {
            setReleasing(false);
            focusRow();
          }}
          onStale={onStale}
        />
      )}
    </li>
  );
};
