import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { openApi } from '@/lib/server/openapi';
import { lucia } from '@/lib/server/people';

export const GET = endpoint(operations.describe, () => openApi(lucia().sessionCookieName));
