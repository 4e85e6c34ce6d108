import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { trail } from '@/lib/server/trail';

export const GET = endpoint(operations.trail, ({ actor, query }) => trail(actor, query.before));
