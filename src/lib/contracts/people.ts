import { z } from 'zod';
import { ROLES } from '@/lib/access';
import { instant } from './common';

export const PASSWORD_MIN_LENGTH = 10;
export const PASSWORD_MAX_LENGTH = 200;

export const role = z.enum(ROLES);

export const person = z.strictObject({ id: z.string(), name: z.string(), email: z.string(), roles: z.array(role) });
export type Person = z.infer<typeof person>;

export const signInBody = z.strictObject({
  email: z.string().trim().min(1, 'Enter your e-mail address.').max(254),
  password: z.string().min(1, 'Enter your password.').max(PASSWORD_MAX_LENGTH, 'That is longer than any password here.'),
});

/** Kept exactly as typed: no trimming, no composition rules. */
export const newPassword = z
  .string()
  .min(PASSWORD_MIN_LENGTH, `Use at least ${PASSWORD_MIN_LENGTH} characters; three or four unrelated words do well.`)
  .max(PASSWORD_MAX_LENGTH, `Use at most ${PASSWORD_MAX_LENGTH} characters.`);

export const changePasswordBody = z.strictObject({
  current: z.string().min(1, 'Enter the password you have now.').max(PASSWORD_MAX_LENGTH),
  next: newPassword,
});

export const sessionInfo = z.strictObject({
  id: z.string().describe('opaque handle of the session, not the cookie'),
  startedAt: instant,
  expiresAt: instant,
  agent: z.string(),
  current: z.boolean(),
});
export type SessionInfo = z.infer<typeof sessionInfo>;
