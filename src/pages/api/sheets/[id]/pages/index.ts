import { operations } from '@/lib/contracts';
import { config } from '@/lib/server/config';
import { endpoint, readUpload } from '@/lib/server/http';
import { uploadPage } from '@/lib/server/sheets';

export const POST = endpoint(operations.addPage, async ({ actor, params, context }) =>
  uploadPage(actor, params.id, await readUpload(context.request, config().maxUploadBytes), context.request.signal),
);
