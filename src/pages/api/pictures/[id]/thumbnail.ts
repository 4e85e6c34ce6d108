import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { thumbnail } from '@/lib/server/sheets';

export const GET = endpoint(operations.thumbnail, async ({ actor, params, context }) => {
  const { picture, make } = await thumbnail(actor, params.id);
  const tag = `"${picture.pngSha256}-small"`;
  const headers = { 'Content-Type': 'image/webp', 'Cache-Control': 'private, no-cache', ETag: tag };
  if (context.request.headers.get('if-none-match') === tag) return new Response(null, { status: 304, headers });
  return new Response(new Uint8Array(await make()), { headers });
});
