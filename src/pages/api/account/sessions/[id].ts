import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { endSession } from '@/lib/server/people';
import { notFound } from '@/lib/server/refusal';

export const DELETE = endpoint(operations.endSession, async ({ actor, params }) => {
  if (!(await endSession(actor.id, params.id))) throw notFound('session');
  return undefined;
});
