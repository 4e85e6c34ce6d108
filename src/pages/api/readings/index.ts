import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { ownReadings } from '@/lib/server/readings';

export const GET = endpoint(operations.readings, ({ actor }) => ownReadings(actor));
