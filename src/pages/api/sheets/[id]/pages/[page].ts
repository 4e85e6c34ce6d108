import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { takePageOff } from '@/lib/server/sheets';

export const DELETE = endpoint(operations.removePage, async ({ actor, params }) => {
  await takePageOff(actor, params.id, params.page);
  return undefined;
});
