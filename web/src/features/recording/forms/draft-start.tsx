import { useQuery } from '@tanstack/react-query';
import type { DraftForm } from '@slighthill/shared/contracts/draft';
import { useState, type ReactNode } from 'react';
import type { z } from 'zod';
import { draftQuery } from '../queries';
import { LoadingDrawer } from './loading-drawer';

interface DraftStartProps<Form> {
  title: string;
  form: DraftForm;
  subject: string;
  /** Reads a kept draft; one of an older shape is left aside. */
  schema: z.ZodType<Form>;
  empty: () => Form;
  onClose: () => void;
  /** Drawn anew, under another key, when the person starts over. */
  children: (start: { start: Form; restoredAt: string | null; onStartOver: () => void }, key: number) => ReactNode;
}

/** Opens with the kept draft, if there is one, else empty. A draft that cannot be read stops nobody from typing. */
export const DraftStart = <Form,>({
  title,
  form,
  subject,
  schema,
  empty,
  onClose,
  children,
}: DraftStartProps<Form>) => {
  const draft = useQuery(draftQuery(form, subject));
  const [fresh, setFresh] = useState(() => ({ key: 0, form: empty() }));
  // What the drawer opened with stays, also when the draft on the server is renewed meanwhile.
  const [opened, setOpened] = useState<{ start: Form; restoredAt: string | null } | null>(null);
  if (draft.isPending) return <LoadingDrawer title={title} onClose={onClose} />;
  if (opened === null) {
    const read = schema.safeParse(draft.data?.content);
    setOpened(
      read.success
        ? { start: read.data, restoredAt: draft.data?.savedAt ?? null }
        : { start: fresh.form, restoredAt: null },
    );
    return null;
  }
  const onStartOver = (): void => {
    const next = { key: fresh.key + 1, form: empty() };
    setFresh(next);
    setOpened({ start: next.form, restoredAt: null });
  };
  return children({ ...opened, onStartOver }, fresh.key);
};
