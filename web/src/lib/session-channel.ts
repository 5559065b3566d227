export type SessionNews = { kind: 'signed-in'; userId: string } | { kind: 'signed-out' };

const name = 'slighthill-session';
const open = (): BroadcastChannel | null =>
  typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel(name);

/** Tells the other tabs of this browser who is signed in now; nothing is stored. */
export const announceSession = (news: SessionNews): void => {
  const channel = open();
  channel?.postMessage(news);
  channel?.close();
};

export const onSessionNews = (listener: (news: SessionNews) => void): (() => void) => {
  const channel = open();
  if (!channel) return () => undefined;
  channel.onmessage = (event: MessageEvent<SessionNews>) => listener(event.data);
  return () => channel.close();
};
