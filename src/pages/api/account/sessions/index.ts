import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { listSessions } from '@/lib/server/people';

export const GET = endpoint(operations.sessions, ({ actor, context }) => listSessions(actor.id, context.locals.session?.id ?? ''));
