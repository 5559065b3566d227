import { lazy, Suspense, useEffect, useRef, useState } from 'react';
import type { Patient } from '@slighthill/shared/contracts/patient';
import { Link, useLocation } from 'react-router-dom';
import { formatTime } from '../../lib/clinic-time';
import { useClinicZone } from '../../lib/session';
import { Button } from '../../ui/button';
import { Icon } from '../../ui/icon';
import { Menu, type MenuItem } from '../../ui/menu';
import { LoadingDrawer } from './forms/loading-drawer';
import type { Saved } from './record-drawer';

const drawers = {
  spirometry: lazy(() => import('./spirometry/spirometry-drawer').then((m) => ({ default: m.SpirometryDrawer }))),
  result: lazy(() => import('./result/result-drawer').then((m) => ({ default: m.ResultDrawer }))),
  'body-size': lazy(() => import('./body-size/body-size-drawer').then((m) => ({ default: m.BodySizeDrawer }))),
  file: lazy(() => import('./file/file-entry-drawer').then((m) => ({ default: m.FileEntryDrawer }))),
};

type DrawerName = keyof typeof drawers;

const titles: Record<DrawerName, string> = {
  spirometry: 'Record spirometry',
  result: 'Record a result',
  'body-size': 'Record body size',
  file: 'Enter in the file',
};

/** What became of the last entry, and the page it is said on: it goes with the next one. */
type Note = { place: string } & ({ kind: 'saved'; saved: Saved } | { kind: 'kept'; at: string });

const NoteWords = ({ note }: { note: Note }) => {
  const timeZone = useClinicZone();
  if (note.kind === 'kept')
    return (
      <span className="text-ink">
        <span className="font-semibold">{`Draft kept ${formatTime(note.at, timeZone)}.`}</span>{' '}
        <span className="text-ink-soft">Not in the record yet.</span>
      </span>
    );
  return (
    <span>
      {`Saved. ${note.saved.words}.`}{' '}
      <Link to={note.saved.to} className="link">
        Show it
      </Link>
    </span>
  );
};

interface RecordMenuProps {
  patient: Patient;
}

/** The Record button of a patient's header and the drawers it opens; says where a saved entry went. */
export const RecordMenu = ({ patient }: RecordMenuProps) => {
  const [open, setOpen] = useState<DrawerName | null>(null);
  const [lastNote, setNote] = useState<Note | null>(null);
  const { key: place } = useLocation();
  const note = lastNote?.place === place ? lastNote : null;
  const button = useRef<HTMLButtonElement>(null);
  const wasOpen = useRef(false);
  useEffect(() => {
    if (open !== null) {
      wasOpen.current = true;
      return undefined;
    }
    if (!wasOpen.current) return undefined;
    // The menu's item that opened the drawer is gone: the focus goes back to the button, after the drawer lets go of it.
    const timer = window.setTimeout(() => button.current?.focus());
    return () => window.clearTimeout(timer);
  }, [open]);
  const mayRecord = patient.abilities.includes('record');
  const mayWriteFile = patient.abilities.includes('write-file') || patient.abilities.includes('order-oxygen');
  if (!mayRecord && !mayWriteFile) return null;

  const item = (name: DrawerName, label: string, note: string, icon: MenuItem['icon']): MenuItem => ({
    label,
    note,
    ...(icon ? { icon } : {}),
    onSelect: () => {
      setNote(null);
      setOpen(name);
    },
  });
  const items = [
    ...(mayRecord
      ? [
          item('spirometry', 'Spirometry', 'Before and after bronchodilator', 'bars'),
          item('result', 'Result', 'Walks, scores, lung volumes and more', 'note'),
          item('body-size', 'Body size', 'Height and weight', 'person'),
        ]
      : []),
    ...(mayWriteFile ? [item('file', 'File entry', 'Diagnosis, oxygen, medicine, holds', 'document')] : []),
  ];
  const Drawer = open ? drawers[open] : null;

  return (
    <div className="flex flex-wrap items-center justify-end gap-y-1">
      <p role="status" className="text-note">
        {note && (
          <span className="mr-3 flex items-center gap-2 text-fern">
            <Icon name="check" size={18} />
            <NoteWords note={note} />
          </span>
        )}
      </p>
      <Menu
        trigger={
          <Button ref={button} kind="main" icon="plus">
            Record
          </Button>
        }
        items={items}
      />
      {Drawer && open && (
        <Suspense fallback={<LoadingDrawer title={titles[open]} onClose={() => setOpen(null)} />}>
          <Drawer
            patient={patient}
            onClose={() => setOpen(null)}
            onSaved={(next) => {
              setNote({ kind: 'saved', saved: next, place });
              setOpen(null);
            }}
            onKept={(at) => setNote({ kind: 'kept', at, place })}
          />
        </Suspense>
      )}
    </div>
  );
};
