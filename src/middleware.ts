import { defineMiddleware, sequence } from 'astro:middleware';
import { gate } from '@/lib/server/http/gate';
import { headers } from '@/lib/server/http/headers';
import { identify } from '@/lib/server/http/identify';

export const onRequest = sequence(defineMiddleware(headers), defineMiddleware(gate), defineMiddleware(identify));
