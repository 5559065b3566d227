import { z } from 'zod';
import { instantOut, uuid } from './common';

export const draftForms = ['patient', 'spirometry', 'measurement', 'body-size', 'file-entry', 'enrollment'] as const;

export const draftParams = z.strictObject({
  form: z.enum(draftForms),
  /** The patient the form is about, or `new`. */
  subject: z.union([z.literal('new'), uuid]),
});

export const draftBody = z.strictObject({ content: z.record(z.string(), z.unknown()) });

export const draft = z.object({
  content: z.record(z.string(), z.unknown()),
  savedAt: instantOut,
  expiresAt: instantOut,
});

export const draftResponse = z.object({ draft: draft.nullable() });

export type Draft = z.infer<typeof draft>;
export type DraftForm = (typeof draftForms)[number];
