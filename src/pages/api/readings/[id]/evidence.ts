import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { evidence } from '@/lib/server/review';

export const GET = endpoint(operations.evidence, ({ actor, params }) => evidence(actor, params.id));
