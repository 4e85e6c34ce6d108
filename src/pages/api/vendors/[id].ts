import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { vendorFor } from '@/lib/server/parts';

export const GET = endpoint(operations.vendor, ({ actor, params }) => vendorFor(actor, params.id));
