import { operations } from '@/lib/contracts';
import { endpoint, withVersion } from '@/lib/server/http';
import { handIn } from '@/lib/server/review';

export const POST = endpoint(operations.handIn, async ({ actor, params, version, body }) => {
  const state = await handIn(actor, params.id, version, body.note);
  return withVersion(state, state.version);
});
