import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { todayFor } from '@/lib/server/today';

export const GET = endpoint(operations.today, ({ actor }) => todayFor(actor));
