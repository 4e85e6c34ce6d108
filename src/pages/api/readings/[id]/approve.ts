import { operations } from '@/lib/contracts';
import { endpoint, withVersion } from '@/lib/server/http';
import { approve } from '@/lib/server/review';

export const POST = endpoint(operations.approve, async ({ actor, params, version }) => {
  const state = await approve(actor, params.id, version);
  return withVersion(state, state.version);
});
