import { operations } from '@/lib/contracts';
import { endpoint, withVersion } from '@/lib/server/http';
import { restore } from '@/lib/server/review';

export const POST = endpoint(operations.restore, async ({ actor, params, version }) => {
  const state = await restore(actor, params.id, version);
  return withVersion(state, state.version);
});
