import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { disablePerson } from '@/lib/server/people';

export const POST = endpoint(operations.disablePerson, ({ actor, params }) => disablePerson(actor, params.id));
