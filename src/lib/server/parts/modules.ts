import { isDeepStrictEqual } from 'node:util';
import {
  addTrail,
  createModule,
  findModule,
  findModuleByIdentity,
  inTransaction,
  listVendors,
  raiseCounter,
  readingStatesOf,
  updateModule,
  vendorNamed,
  type ModuleRecord,
} from '@db';
import { can } from '@/lib/access';
import type { ModuleBody, ModuleView, VendorView } from '@/lib/contracts';
import { requireCan, type SignedInPerson } from '../people';
import { conflict, lostRace, notAllowed, notFound } from '../refusal';

export const moduleName = (module: Pick<ModuleRecord, 'partNumber' | 'variant'>) =>
  [module.partNumber, module.variant].filter(Boolean).join(' ');

export const toModuleView = (module: ModuleRecord): ModuleView => ({ ...module, ratings: [...module.ratings] });

export const vendorList = (): Promise<VendorView[]> => listVendors();

export async function moduleById(id: number): Promise<ModuleRecord> {
  const module = await findModule(id);
  if (!module) throw notFound('module');
  return module;
}

const alreadyThere = (module: ModuleRecord) =>
  conflict(
    `${module.vendor.name} ${moduleName(module)} is already in the catalogue: use that one, or give this one a variant.`,
    'module-exists',
  );

/** Adds a module as printed; vendor, part number and variant together are its identity. */
export async function addModule(actor: SignedInPerson, body: ModuleBody): Promise<ModuleRecord> {
  requireCan(actor, 'module.create');
  const id = await inTransaction(async () => {
    const vendor = await vendorNamed(body.vendor);
    const there = await findModuleByIdentity(vendor.id, body.partNumber, body.variant);
    if (there) throw alreadyThere(there);
    const made = await createModule(vendor.id, body);
    await addTrail({
      userId: actor.id,
      action: 'added module',
      object: `module/${made}`,
      detail: { vendor: vendor.name, part: moduleName(body) },
    });
    return made;
  });
  return moduleById(id);
}

/** A reading that is still in its owner's hands, and so leaves its module to be corrected. */
export const isOpen = (state: string) => state === 'draft' || state === 'returned';

/** Whoever reads may correct a module until one of its readings was handed in; after that it is the librarian's. */
async function requireMayEdit(actor: SignedInPerson, id: number): Promise<void> {
  if (can(actor, 'module.edit')) return;
  requireCan(actor, 'module.create');
  if (!(await readingStatesOf(id)).every(isOpen))
    throw notAllowed('A reading of this module was handed in, so its identity and ratings are now a librarian’s to change.');
}

const bySide = (ratings: ModuleBody['ratings']) => [...ratings].sort((a, b) => a.hotSideC - b.hotSideC);

/** Whether a body says what is stored already. */
function isSame({ id: _id, version: _version, vendor, ratings, ...identity }: ModuleRecord, body: ModuleBody): boolean {
  return isDeepStrictEqual({ ...identity, vendor: vendor.name, ratings: bySide([...ratings]) }, { ...body, ratings: bySide(body.ratings) });
}

/** Changes identity and ratings of a module, over the named version only. */
export async function changeModule(actor: SignedInPerson, id: number, version: number, body: ModuleBody): Promise<ModuleRecord> {
  await inTransaction(async () => {
    const before = await moduleById(id);
    await requireMayEdit(actor, id);
    const vendor = await vendorNamed(body.vendor);
    const there = await findModuleByIdentity(vendor.id, body.partNumber, body.variant, id);
    if (there) throw alreadyThere(there);
    if (isSame(before, body)) return; // a repeat whose answer was lost
    if (!(await updateModule(id, version, vendor.id, body))) throw lostRace(toModuleView(before));
    await raiseCounter('catalogue');
    await addTrail({ userId: actor.id, action: 'changed module', object: `module/${id}`, detail: { before: toModuleView(before) } });
  });
  return moduleById(id);
}
