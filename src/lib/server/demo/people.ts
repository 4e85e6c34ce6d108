import { createHash } from 'node:crypto';
import { addTrail, createPerson, inTransaction } from '@db';
import type { Role } from '@/lib/access';
import { hashPassword } from '../people';

export interface DemoPerson {
  readonly name: string;
  readonly email: string;
  readonly roles: readonly Role[];
}

/** An invented small maker of portable vaccine coolers and sample chillers. */
export const DEMO_PEOPLE: readonly DemoPerson[] = [
  { name: 'Ilse Marrow', email: 'ilse@kelda.example', roles: ['engineer'] },
  { name: 'Soren Quill', email: 'soren@kelda.example', roles: ['librarian'] },
  { name: 'Tamsin Vale', email: 'tamsin@kelda.example', roles: ['designer'] },
  { name: 'Odd Brenner', email: 'odd@kelda.example', roles: ['administrator'] },
  { name: 'Petra Ames', email: 'petra@kelda.example', roles: ['engineer', 'librarian'] },
];

/** Well known on purpose: demo mode listens on this machine only. */
export const DEMO_PASSWORD = 'couplet-demo';

export const demoPersonId = (person: DemoPerson) => createHash('sha256').update(person.email).digest('hex').slice(0, 16);

/** Makes the demo people of an empty database. */
export async function seedPeople(): Promise<void> {
  const hashes = await Promise.all(DEMO_PEOPLE.map(() => hashPassword(DEMO_PASSWORD)));
  await inTransaction(async () => {
    for (const [at, person] of DEMO_PEOPLE.entries())
      await createPerson({ id: demoPersonId(person), ...person, passwordHash: hashes[at] ?? '' });
    await addTrail({ userId: null, action: 'seeded demo people' });
  });
}
