type Listener = (reason: string) => void;

const listeners = new Set<Listener>();

/** Told by the API client when a request found no session; heard by the cover that asks for the password. */
export const sessionEnded = (reason: string): void => {
  for (const listener of listeners) listener(reason);
};

export const onSessionEnded = (listener: Listener): (() => void) => {
  listeners.add(listener);
  return () => {
    listeners.delete(listener);
  };
};
