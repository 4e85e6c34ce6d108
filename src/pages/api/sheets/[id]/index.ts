import { operations } from '@/lib/contracts';
import { endpoint, withVersion } from '@/lib/server/http';
import { changeSheet, sheetFor } from '@/lib/server/sheets';

export const GET = endpoint(operations.sheet, async ({ actor, params }) => {
  const sheet = await sheetFor(actor, params.id);
  return withVersion(sheet, sheet.version);
});

export const PUT = endpoint(operations.updateSheet, async ({ actor, params, body, version }) => {
  const sheet = await changeSheet(actor, params.id, version, body);
  return withVersion(sheet, sheet.version);
});
