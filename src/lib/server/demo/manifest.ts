import { z } from 'zod';
import { moduleBody, sheetBody } from '@/lib/contracts';

const slug = z.string().regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'Use small letters, figures and hyphens.');

/** A path from the folder of the manifest, downwards only. */
const file = z.string().regex(/^sheets\/[a-z0-9-]+\/[a-z0-9-]+(\.reading)?\.(png|jpg|json)$/, 'Name a file under sheets/.');

const vendor = z.strictObject({ name: z.string().min(1), series: z.string().describe('what its modules are named after') });

const page = z.strictObject({ file, title: z.string().min(1) });

const sheet = z.strictObject({ slug, sheet: sheetBody, pages: z.array(page).min(1).describe('in the order of the sheet') });

const module = z.strictObject({ slug, module: moduleBody });

const reading = z.strictObject({ file, sheet: slug, module: slug });

/**
 * What `samples/` holds, in the shape in which the use cases take it: `sheet` goes to `addSheet`, each page's file to `uploadPage`,
 * `module` to `addModule`, and the reading document, whose images are file names of the sheet's pages, to a draft.
 */
export const samplesManifest = z
  .strictObject({
    format: z.literal('couplet.samples'),
    version: z.literal(1),
    vendors: z.array(vendor),
    sheets: z.array(sheet),
    modules: z.array(module),
    readings: z.array(reading),
  })
  .superRefine((manifest, context) => {
    for (const message of danglingOf(manifest)) context.addIssue({ code: 'custom', message });
  });
export type SamplesManifest = z.infer<typeof samplesManifest>;

interface Names {
  readonly vendors: readonly { readonly name: string }[];
  readonly sheets: readonly { readonly slug: string; readonly sheet: { readonly vendor: string } }[];
  readonly modules: readonly { readonly slug: string; readonly module: { readonly vendor: string } }[];
  readonly readings: readonly { readonly file: string; readonly sheet: string; readonly module: string }[];
}

/** Names that lead nowhere, and readings whose sheet and module are of two vendors; a sentence for each. */
function danglingOf({ vendors, sheets, modules, readings }: Names): string[] {
  const known = new Set(vendors.map(({ name }) => name));
  const sheetVendor = new Map(sheets.map(({ slug, sheet }) => [slug, sheet.vendor]));
  const moduleVendor = new Map(modules.map(({ slug, module }) => [slug, module.vendor]));
  const strangers = [...sheetVendor, ...moduleVendor].filter(([, name]) => !known.has(name));
  return [
    ...strangers.map(([name, vendor]) => `${name} is of ${vendor}, which is not among the vendors.`),
    ...readings.flatMap(({ file, sheet, module }) => {
      const [ofSheet, ofModule] = [sheetVendor.get(sheet), moduleVendor.get(module)];
      if (ofSheet === undefined) return [`${file} names the sheet ${sheet}, which is not there.`];
      if (ofModule === undefined) return [`${file} names the module ${module}, which is not there.`];
      return ofSheet === ofModule ? [] : [`${file} joins a sheet of ${ofSheet} to a module of ${ofModule}.`];
    }),
  ];
}

/** The manifest out of its JSON text; throws with every fault named. */
export const parseManifest = (text: string): SamplesManifest => samplesManifest.parse(JSON.parse(text));
