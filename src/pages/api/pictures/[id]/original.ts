import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { originalFile } from '@/lib/server/sheets';

const rfc5987 = (name: string) => encodeURIComponent(name).replace(/['()*]/g, (c) => `%${c.charCodeAt(0).toString(16).toUpperCase()}`);

export const GET = endpoint(operations.original, async ({ actor, params }) => {
  const { bytes, picture } = await originalFile(actor, params.id);
  return new Response(new Uint8Array(bytes), {
    headers: {
      'Content-Type': picture.mediaType,
      'Content-Disposition': `attachment; filename="original"; filename*=UTF-8''${rfc5987(picture.originalName)}`,
    },
  });
});
