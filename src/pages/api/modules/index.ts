import { operations } from '@/lib/contracts';
import { endpoint, withVersion } from '@/lib/server/http';
import { addModule, toModuleView } from '@/lib/server/parts';

export const POST = endpoint(operations.createModule, async ({ actor, body }) => {
  const module = await addModule(actor, body);
  return withVersion(toModuleView(module), module.version, { Location: `/api/modules/${module.id}` });
});
