import { UserError } from './user-error';

export class Interrupted extends UserError {
  override name = 'Interrupted';
}

/**
 * Turns Ctrl-C and the other polite requests to end into an abort signal. Started by npm, it also ends when npm itself
 * was ended by force: nobody would be left to press Ctrl-C.
 */
export function listenForInterruption(): AbortSignal {
  const controller = new AbortController();
  const interrupt = () => controller.abort(new Interrupted('Stopped.'));
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, interrupt);
  if (process.env.npm_lifecycle_event) {
    const parent = process.ppid;
    setInterval(() => process.ppid !== parent && interrupt(), 1_000).unref();
  }
  return controller.signal;
}

/** Resolves when the signal is aborted. */
export function interruption(signal: AbortSignal): Promise<'interrupted'> {
  return new Promise((resolve) => {
    if (signal.aborted) resolve('interrupted');
    else signal.addEventListener('abort', () => resolve('interrupted'), { once: true });
  });
}
