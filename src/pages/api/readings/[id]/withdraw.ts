import { operations } from '@/lib/contracts';
import { endpoint, withVersion } from '@/lib/server/http';
import { withdraw } from '@/lib/server/review';

export const POST = endpoint(operations.withdraw, async ({ actor, params, version, body }) => {
  const state = await withdraw(actor, params.id, version, body.reason);
  return withVersion(state, state.version);
});
