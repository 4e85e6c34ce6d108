import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { intakePng } from '@/lib/server/sheets';

export const GET = endpoint(operations.picture, async ({ actor, params, context }) => {
  const { bytes, picture } = await intakePng(actor, params.id);
  const tag = `"${picture.pngSha256}"`;
  // revalidated each time: the cookie decides, and the bytes never change under an id
  const headers = { 'Content-Type': 'image/png', 'Cache-Control': 'private, no-cache', ETag: tag };
  if (context.request.headers.get('if-none-match') === tag) return new Response(null, { status: 304, headers });
  return new Response(new Uint8Array(bytes), { headers });
});
