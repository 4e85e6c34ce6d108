import { addTrail, findPerson, inTransaction, setPasswordHash } from '@db';
import { notFound, wrongInput } from '../refusal';
import { hashPassword, verifyPassword } from './passwords';
import { endOtherSessions } from './sessions';
import type { SignedInPerson } from './sign-in';

export const TOO_EASY = 'This is one of the first that a guesser would try: use other words.';

/** Words that everybody who guesses passwords here would try first. */
const EXPECTED = ['couplet', 'thermoelectric', 'peltier', 'password', 'qwerty', '1234567890'];

export const tooEasy = (password: string, person: Pick<SignedInPerson, 'email'>): boolean => {
  const plain = password.toLowerCase();
  return EXPECTED.some((word) => plain.replaceAll(word, '').length < 6) || plain.includes(person.email.toLowerCase());
};

/** Sets a new password when the old one is right, and ends every other session. */
export async function changePassword(person: SignedInPerson, sessionId: string, change: { current: string; next: string }): Promise<void> {
  const record = await findPerson(person.id);
  if (!record) throw notFound('person');
  if (!(await verifyPassword(record.passwordHash, change.current))) throw wrongInput({ current: 'This is not the password you have now.' });
  if (tooEasy(change.next, person)) throw wrongInput({ next: TOO_EASY });
  const passwordHash = await hashPassword(change.next);
  await inTransaction(async () => {
    await setPasswordHash(person.id, passwordHash);
    await endOtherSessions(person.id, sessionId);
    await addTrail({ userId: person.id, action: 'changed password' });
  });
}
