import { operations } from '@/lib/contracts';
import { approvedModelOf } from '@/lib/server/catalogue';
import { endpoint } from '@/lib/server/http';
import { Refusal } from '@/lib/server/refusal';

export const GET = endpoint(operations.moduleModel, async ({ actor, params }) => {
  const model = await approvedModelOf(actor, params.id);
  if (!model) throw new Refusal(404, 'no-model', 'No reading of this module is approved yet, so it has no model.');
  return model;
});
