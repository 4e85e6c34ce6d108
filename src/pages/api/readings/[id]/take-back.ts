import { operations } from '@/lib/contracts';
import { endpoint, withVersion } from '@/lib/server/http';
import { takeBack } from '@/lib/server/review';

export const POST = endpoint(operations.takeBack, async ({ actor, params, version }) => {
  const state = await takeBack(actor, params.id, version);
  return withVersion(state, state.version);
});
