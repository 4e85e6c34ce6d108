import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';

export const GET = endpoint(operations.health, () => ({ ok: true as const }));
