import { Ajv2020 } from 'ajv/dist/2020.js';
import addFormats from 'ajv-formats';

interface Promised {
  readonly responses: Record<string, { content?: Record<string, { schema: object }> }>;
}
interface Description {
  readonly paths: Record<string, Record<string, Promised>>;
  readonly components: { readonly schemas: Record<string, object> };
}

const ajv = new Ajv2020({ strict: false, allErrors: true });
(addFormats as unknown as (ajv: Ajv2020) => void)(ajv);
let description: Promise<Description> | undefined;

/** Successful answers that were held against the description and fit it, as "GET /api/me 200"; those of one test file. */
export const heldAnswers = new Set<string>();

const pathOf = (description: Description, pathname: string) =>
  Object.keys(description.paths)
    .filter((path) => new RegExp(`^${path.replaceAll('.', '\\.').replace(/\{\w+\}/g, '[^/]+')}$`).test(pathname))
    .sort((a, b) => a.split('{').length - b.split('{').length)[0];

const inAjv = (text: string) => text.replaceAll('#/components/schemas/', 'https://couplet.example/schemas/');

function validator(promised: Description, schema: object) {
  for (const [name, shape] of Object.entries(promised.components.schemas)) {
    const $id = `https://couplet.example/schemas/${name}`;
    if (!ajv.getSchema($id)) ajv.addSchema({ ...shape, $id });
  }
  return ajv.compile(JSON.parse(inAjv(JSON.stringify(schema))) as object);
}

async function checkBody(promised: Description, call: string, content: Record<string, { schema: object }>, answer: Response) {
  const [type, media] = Object.entries(content)[0] ?? [];
  if (!type || !media) return;
  const got = answer.headers.get('content-type')?.split(';')[0];
  if (type !== 'application/octet-stream' && got !== type) throw new Error(`${call} answered ${got}, not ${type}.`);
  if (!type.endsWith('json')) return;
  const validate = validator(promised, media.schema);
  if (!validate(await answer.clone().json()))
    throw new Error(`${call} ${answer.status} does not fit its description: ${ajv.errorsText(validate.errors)}`);
}

/** Holds a real answer of the API against what its description promises; throws where they differ. Pages are left alone. */
export async function checkAgainstDescription(base: string, method: string, pathname: string, answer: Response): Promise<void> {
  if (!pathname.startsWith('/api/')) return;
  description ??= fetch(`${base}/api/openapi.json`).then((it) => it.json() as Promise<Description>);
  const promised = await description;
  const path = pathOf(promised, pathname);
  const operation = path && promised.paths[path]?.[method.toLowerCase()];
  if (!operation) throw new Error(`${method} ${pathname} is no call of the description.`);
  const call = `${method} ${path}`;
  const response = operation.responses[String(answer.status)];
  if (!response) throw new Error(`${call} answered ${answer.status}, which its description does not promise.`);
  await checkBody(promised, call, response.content ?? {}, answer);
  if (answer.ok) heldAnswers.add(`${call} ${answer.status}`);
}
