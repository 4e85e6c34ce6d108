import { operations } from '@/lib/contracts';
import { endpoint, withVersion } from '@/lib/server/http';
import { addSheet, sheetList } from '@/lib/server/sheets';

export const GET = endpoint(operations.sheets, ({ actor, query }) => sheetList(actor, query.q));

export const POST = endpoint(operations.createSheet, async ({ actor, body }) => {
  const sheet = await addSheet(actor, body);
  return withVersion(sheet, sheet.version, { Location: `/api/sheets/${sheet.id}` });
});
