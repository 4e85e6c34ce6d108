import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { addPerson, team } from '@/lib/server/people';

export const GET = endpoint(operations.people, ({ actor }) => team(actor));

export const POST = endpoint(operations.addPerson, ({ actor, body }) => addPerson(actor, body));
