import { messagesEn, type MessageKey, type Messages } from './messages-en';

/** Languages the product can show. English is the only one whose texts are written so far. */
const catalogs = { en: messagesEn } as const satisfies Record<string, Messages>;

export type Language = keyof typeof catalogs;

export const translate = (
  key: MessageKey,
  values: Record<string, string | number> = {},
  language: Language = 'en',
): string =>
  (catalogs[language][key] as string).replace(/\{(\w+)\}/g, (hole, name: string) => String(values[name] ?? hole));
