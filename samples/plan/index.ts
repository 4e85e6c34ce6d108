import type { SheetPlan, VendorPlan } from '../draw/plan';
import { dunmarrow } from './dunmarrow';
import { ormsund } from './ormsund';
import { pellamy } from './pellamy';
import { thistlecap } from './thistlecap';
import { veltrane } from './veltrane';

export const vendors: readonly VendorPlan[] = [ormsund, veltrane, thistlecap, dunmarrow, pellamy];

export const sheets: readonly SheetPlan[] = vendors.flatMap((vendor) => vendor.sheets);
