import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { reviewQueue } from '@/lib/server/review';

export const GET = endpoint(operations.review, ({ actor }) => reviewQueue(actor));
