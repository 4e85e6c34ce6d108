import { Ajv2020 } from 'ajv/dist/2020.js';
import addFormats from 'ajv-formats';

interface Description {
  readonly paths: Record<string, Record<string, { responses: Record<string, { content?: Record<string, { schema: object }> }> }>>;
  readonly components: { readonly schemas: Record<string, object> };
}

const ajv = new Ajv2020({ strict: false, allErrors: true });
(addFormats as unknown as (ajv: Ajv2020) => void)(ajv);
let description: Promise<Description> | undefined;

const pathOf = (description: Description, pathname: string) =>
  Object.keys(description.paths)
    .filter((path) => new RegExp(`^${path.replaceAll('.', '\\.').replace(/\{\w+\}/g, '[^/]+')}$`).test(pathname))
    .sort((a, b) => a.split('{').length - b.split('{').length)[0];

/** Holds a real answer of the API against what its description promises; throws where they differ. */
export async function checkAgainstDescription(base: string, method: string, pathname: string, answer: Response): Promise<void> {
  description ??= fetch(`${base}/api/openapi.json`).then((it) => it.json() as Promise<Description>);
  const promised = await description;
  const path = pathOf(promised, pathname);
  const operation = path && promised.paths[path]?.[method.toLowerCase()];
  if (!operation) return;
  const response = operation.responses[String(answer.status)];
  if (!response) throw new Error(`${method} ${path} answered ${answer.status}, which its description does not promise.`);
  const [type, media] = Object.entries(response.content ?? {})[0] ?? [];
  if (!type || !media) return;
  const got = answer.headers.get('content-type')?.split(';')[0];
  if (type !== 'application/octet-stream' && got !== type) throw new Error(`${method} ${path} answered ${got}, not ${type}.`);
  if (!type.endsWith('json')) return;
  const schema = JSON.parse(JSON.stringify(media.schema).replaceAll('#/components/schemas/', 'https://couplet.example/schemas/')) as object;
  for (const [name, shape] of Object.entries(promised.components.schemas))
    if (!ajv.getSchema(`https://couplet.example/schemas/${name}`))
      ajv.addSchema({ ...shape, $id: `https://couplet.example/schemas/${name}` });
  const validate = ajv.compile(schema);
  if (!validate(await answer.clone().json()))
    throw new Error(`${method} ${path} ${answer.status} does not fit its description: ${ajv.errorsText(validate.errors)}`);
}
