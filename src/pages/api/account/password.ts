import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { changePassword } from '@/lib/server/people';

export const POST = endpoint(operations.changePassword, async ({ actor, body, context }) => {
  await changePassword(actor, context.locals.session?.id ?? '', body);
  return undefined;
});
