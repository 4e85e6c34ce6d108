import { findVendor, listModules, readingStatesByModule, type ReadingState } from '@db';
import { can } from '@/lib/access';
import type { VendorDetail } from '@/lib/contracts';
import { requireCan, type SignedInPerson } from '../people';
import { notFound } from '../refusal';
import { sheetsSeen } from '../sheets';
import { isOpen, toModuleView } from './modules';

/** A vendor with its modules and those of its sheets that this person may see. */
export async function vendorFor(actor: SignedInPerson, id: number): Promise<VendorDetail> {
  requireCan(actor, 'catalogue.see');
  const vendor = await findVendor(id);
  if (!vendor) throw notFound('vendor');
  const [modules, sheets] = await Promise.all([listModules({ vendorId: id }), sheetsSeen(actor, id)]);
  const states = await readingStatesByModule(modules.map((module) => module.id));
  const mayEdit = (of: readonly ReadingState[]) => can(actor, 'module.edit') || (can(actor, 'module.create') && of.every(isOpen));
  return {
    ...vendor,
    modules: modules.map((module) => {
      const of = states.get(module.id) ?? [];
      return { ...toModuleView(module), approved: of.includes('approved'), mayEdit: mayEdit(of) };
    }),
    sheets,
  };
}
