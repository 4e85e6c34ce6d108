import { operations } from '@/lib/contracts';
import { endpoint, withVersion } from '@/lib/server/http';
import { readingView, saveReading } from '@/lib/server/readings';

export const GET = endpoint(operations.reading, async ({ actor, params }) => {
  const view = await readingView(actor, params.id);
  return withVersion(view, view.version);
});

export const PUT = endpoint(operations.saveReading, async ({ actor, params, body, version }) => {
  const saved = await saveReading(actor, params.id, version, body.document);
  return withVersion(saved, saved.version);
});
