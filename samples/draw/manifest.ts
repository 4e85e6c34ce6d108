import type { SamplesManifest } from '@/lib/server/demo/manifest';
import type { VendorPlan } from './plan';
import type { DrawnSheet } from './sheet';

/** Where a file of a sheet lies, from the folder `samples/`. */
export const pathOf = ({ plan }: DrawnSheet, name: string): string => `sheets/${plan.slug}/${name}`;

/** What the sheets hold, for whoever brings them into the program. */
export function manifestOf(vendors: readonly VendorPlan[], drawn: readonly DrawnSheet[]): SamplesManifest {
  return {
    format: 'couplet.samples',
    version: 1,
    vendors: vendors.map(({ name, series }) => ({ name, series })),
    sheets: drawn.map((sheet) => ({
      slug: sheet.plan.slug,
      sheet: sheet.plan.body,
      pages: sheet.pictures.map(({ name, title }) => ({ file: pathOf(sheet, name), title })),
    })),
    modules: drawn.flatMap(({ readings }) => readings.map(({ made }) => ({ slug: made.slug, module: made.body }))),
    readings: drawn.flatMap((sheet) =>
      sheet.readings.map(({ name, made }) => ({ file: pathOf(sheet, name), sheet: sheet.plan.slug, module: made.slug })),
    ),
  };
}
