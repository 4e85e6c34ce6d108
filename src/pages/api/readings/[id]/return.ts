import { operations } from '@/lib/contracts';
import { endpoint, withVersion } from '@/lib/server/http';
import { returnToOwner } from '@/lib/server/review';

export const POST = endpoint(operations.returnReading, async ({ actor, params, version, body }) => {
  const state = await returnToOwner(actor, params.id, version, body.reason);
  return withVersion(state, state.version);
});
