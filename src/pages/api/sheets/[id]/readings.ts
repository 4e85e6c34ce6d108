import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { startReading } from '@/lib/server/readings';

export const POST = endpoint(operations.startReading, async ({ actor, params, body }) => ({
  id: await startReading(actor, params.id, body.moduleId),
}));
