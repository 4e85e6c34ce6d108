import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { modelOf } from '@/lib/server/readings';

export const POST = endpoint(operations.fitReading, ({ actor, params, body }) => modelOf(actor, params.id, body.document));
