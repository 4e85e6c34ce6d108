import { operations } from '@/lib/contracts';
import { dutySearch } from '@/lib/server/duty';
import { endpoint } from '@/lib/server/http';

export const POST = endpoint(operations.duty, ({ actor, body: { rows, ...duty } }) => dutySearch(actor, duty, rows));
