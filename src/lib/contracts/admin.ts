import { z } from 'zod';
import { instant, line, rowId } from './common';
import { person, role } from './people';

/** One message of the queue, whatever became of it. */
export const mailItem = z.strictObject({
  id: rowId,
  recipient: z.string(),
  subject: z.string(),
  body: z.string(),
  state: z.enum(['queued', 'sending', 'sent', 'failed']),
  tries: z.int().describe('how often sending failed'),
  nextTryAt: instant.nullable().describe('while it is queued'),
  lastError: z.string(),
  createdAt: instant,
  sentAt: instant.nullable(),
});
export type MailItem = z.infer<typeof mailItem>;

/** One entry of the trail: who did what to what, and when. */
export const trailEntry = z.strictObject({
  id: rowId,
  at: instant,
  by: z.string().describe('empty where nobody was signed in'),
  action: z.string(),
  object: z.string().describe('kind and number, like reading/12; empty where there is none'),
  objectName: z.string().describe('name of the person it was done to; else empty'),
  detail: z.record(z.string(), z.unknown()),
});
export type TrailEntry = z.infer<typeof trailEntry>;

export const trailQuery = z.strictObject({ before: rowId.optional().describe('only entries older than this one') });
export const trailPage = z.strictObject({
  entries: z.array(trailEntry),
  before: rowId.nullable().describe('what to ask for next; null at the oldest entry'),
});
export type TrailPage = z.infer<typeof trailPage>;

export const member = person.extend({ disabled: z.boolean(), since: instant });
export type Member = z.infer<typeof member>;

const roles = z
  .array(role)
  .min(1, 'Choose at least one role.')
  .refine((list) => new Set(list).size === list.length, 'Name each role once.');

const LONGEST_EMAIL = 254;
const email = z
  .string()
  .trim()
  .toLowerCase()
  .min(1, 'Enter an e-mail address.')
  .max(LONGEST_EMAIL, `Keep the address within ${LONGEST_EMAIL} characters.`)
  .regex(z.regexes.email, 'Enter an e-mail address, like name@example.org.');

export const addPersonBody = z.strictObject({ email, name: line(120).min(1, 'Enter the name as others should see it.'), roles });
export type AddPersonBody = z.infer<typeof addPersonBody>;

export const addedPerson = z.strictObject({
  person: member,
  password: z.string().describe('shown this once and kept nowhere'),
});
export type AddedPerson = z.infer<typeof addedPerson>;

export const rolesBody = z.strictObject({ roles });
export const personParams = z.strictObject({ id: z.string().min(1).max(64) });
