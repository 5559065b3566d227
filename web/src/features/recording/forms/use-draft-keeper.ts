import { useCallback, useEffect, useEffectEvent, useRef, useState } from 'react';
import type { Draft, DraftForm } from '@slighthill/shared/contracts/draft';
import { apiFetch } from '../../../lib/api-fetch';

const waitMs = 2000;

export type DraftState = { kind: 'none' } | { kind: 'kept'; at: string } | { kind: 'failed' };

export interface DraftKeeper {
  state: DraftState;
  /** True while what is on the screen lies on the server as a draft. */
  current: boolean;
  /** When it was kept; null when that failed. */
  keepNow: () => Promise<string | null>;
  /** Takes the draft away; nothing more is kept, unless another entry follows in the same drawer. */
  discard: (another?: boolean) => Promise<void>;
}

interface DraftSource {
  form: DraftForm;
  subject: string;
  values: Record<string, unknown>;
  /** False while nothing was typed, or where drafts are not kept. */
  enabled: boolean;
  /** When the draft that the form opened with was kept. */
  restoredAt: string | null;
}

/** Keeps what is typed on the server, two seconds after the last change; one write after the other. */
export const useDraftKeeper = ({ form, subject, values, enabled, restoredAt }: DraftSource): DraftKeeper => {
  const path = `/api/drafts/${form}/${subject}`;
  const text = JSON.stringify(values);
  const [state, setState] = useState<DraftState>(restoredAt ? { kind: 'kept', at: restoredAt } : { kind: 'none' });
  const [keptText, setKeptText] = useState(text);
  const queue = useRef<Promise<unknown>>(Promise.resolve());
  const ended = useRef(false);

  const keep = useCallback(
    (content: string): Promise<string | null> => {
      const next = queue.current.then(async () => {
        if (ended.current) return null;
        try {
          const body = { content: JSON.parse(content) as unknown };
          const answer = await apiFetch<{ draft: Draft | null } | undefined>(path, { method: 'PUT', body });
          setKeptText(content);
          const at = answer?.draft?.savedAt ?? new Date().toISOString();
          setState({ kind: 'kept', at });
          return at;
        } catch {
          setState({ kind: 'failed' });
          return null;
        }
      });
      queue.current = next;
      return next;
    },
    [path],
  );

  const keepLatest = useEffectEvent((content: string) => void keep(content));

  useEffect(() => {
    if (!enabled || text === keptText) return undefined;
    const timer = window.setTimeout(() => keepLatest(text), waitMs);
    return () => window.clearTimeout(timer);
  }, [enabled, text, keptText]);

  const discard = useCallback(
    async (another = false) => {
      ended.current = true;
      setState({ kind: 'none' });
      await queue.current;
      try {
        await apiFetch(path, { method: 'DELETE' });
      } catch {
        // The draft goes by itself after seven days; what is saved carries its own id and is not stored twice.
      }
      if (another) ended.current = false;
    },
    [path],
  );

  return { state, current: state.kind === 'kept' && text === keptText, keepNow: () => keep(text), discard };
};
