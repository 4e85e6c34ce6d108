import { operations } from '@/lib/contracts';
import { endpoint, withVersion } from '@/lib/server/http';
import { changeModule, moduleById, toModuleView } from '@/lib/server/parts';

export const GET = endpoint(operations.module, async ({ params }) => {
  const module = await moduleById(params.id);
  return withVersion(toModuleView(module), module.version);
});

export const PUT = endpoint(operations.updateModule, async ({ actor, params, body, version }) => {
  const module = await changeModule(actor, params.id, version, body);
  return withVersion(toModuleView(module), module.version);
});
