import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { enablePerson } from '@/lib/server/people';

export const POST = endpoint(operations.enablePerson, ({ actor, params }) => enablePerson(actor, params.id));
