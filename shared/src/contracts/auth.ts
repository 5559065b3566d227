import { z } from 'zod';
import { abilities, areas } from '../permissions';
import { text, uuid } from './common';
import { clinicRules } from './clinic';

export const signInBody = z.strictObject({
  email: z.string({ error: 'Enter your e-mail address' }).trim().min(1, 'Enter your e-mail address').max(254),
  password: z.string({ error: 'Enter your password' }).min(1, 'Enter your password').max(200),
});

export const currentUser = z.object({
  id: uuid,
  displayName: z.string(),
  title: z.string(),
  email: z.string(),
  clinic: z.object({
    id: uuid,
    name: z.string(),
    timeZone: z.string(),
    phone: z.string().nullable(),
    ...clinicRules,
  }),
  abilities: z.array(z.enum(abilities)),
  areas: z.array(z.enum(areas)),
  firstPath: z.string(),
  idleSeconds: z.int().nullable(),
  patientId: uuid.nullable(),
});

export const userResponse = z.object({ user: currentUser });

export const invitationLookUpBody = z.strictObject({ token: text(200, 'The link') });
export const invitationResponse = z.object({ displayName: z.string(), email: z.string(), clinicName: z.string() });
export const newPassword = z
  .string({ error: 'Choose a password' })
  .min(12, 'Use at least 12 characters')
  .max(200, 'Use at most 200 characters');
export const invitationAcceptBody = z.strictObject({ token: text(200, 'The link'), password: newPassword });

export type SignInBody = z.infer<typeof signInBody>;
export type CurrentUser = z.infer<typeof currentUser>;
export type Invitation = z.infer<typeof invitationResponse>;
