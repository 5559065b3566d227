import type { MessageKey } from '../../i18n/messages-en';
import { toLocalInput } from '../../lib/clinic-time';

/** Morning until noon, afternoon until six, by the clinic's clock. */
export const greetingKey = (now: Date, timeZone: string): MessageKey => {
  const hour = Number(toLocalInput(now, timeZone).slice(11, 13));
  if (hour < 12) return 'home.greeting.morning';
  return hour < 18 ? 'home.greeting.afternoon' : 'home.greeting.evening';
};
