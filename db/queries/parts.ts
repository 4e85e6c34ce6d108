import { Op } from 'sequelize';
import type { ModuleBody, ModuleIdentity, Rating as RatingView } from '@/lib/contracts';
import { Module, Rating, Reading, Vendor, type ReadingState } from '../models';

export interface VendorRecord {
  readonly id: number;
  readonly name: string;
}

export interface ModuleRecord extends ModuleIdentity {
  readonly id: number;
  readonly vendor: VendorRecord;
  readonly ratings: readonly RatingView[];
  readonly version: number;
}

const whole = {
  include: [
    { model: Vendor, as: 'vendor' },
    { model: Rating, as: 'ratings' },
  ],
};

const pair = (a: number | null, b: number | null): [number, number] | null => (a == null || b == null ? null : [a, b]);

const toRating = (row: Rating): RatingView => ({
  hotSideC: row.hotSideC,
  imaxA: row.imaxA,
  vmaxV: row.vmaxV,
  qmaxW: row.qmaxW,
  dTmaxK: row.dTmaxK,
  imaxMeans: row.imaxMeans,
  basis: row.basis,
  atmosphere: row.atmosphere,
  tolerancePercent: row.tolerancePercent,
});

export const toModule = (row: Module): ModuleRecord => ({
  id: row.id,
  vendor: { id: row.vendorId, name: row.vendor?.name ?? '' },
  partNumber: row.partNumber,
  variant: row.variant,
  stages: row.stages,
  couples: row.couples,
  coldPlateMm: pair(row.coldPlateWidthMm, row.coldPlateDepthMm),
  hotPlateMm: pair(row.hotPlateWidthMm, row.hotPlateDepthMm),
  heightMm: row.heightMm,
  maxTemperatureC: row.maxTemperatureC,
  leadsOhm: row.leadsOhm,
  sealing: row.sealing,
  acResistanceOhm: row.acResistanceOhm,
  acResistanceAtC: row.acResistanceAtC,
  ratings: (row.ratings ?? []).map(toRating).sort((a, b) => a.hotSideC - b.hotSideC),
  version: row.version,
});

const columns = (identity: ModuleIdentity) => ({
  partNumber: identity.partNumber,
  variant: identity.variant,
  stages: identity.stages,
  couples: identity.couples,
  coldPlateWidthMm: identity.coldPlateMm?.[0] ?? null,
  coldPlateDepthMm: identity.coldPlateMm?.[1] ?? null,
  hotPlateWidthMm: identity.hotPlateMm?.[0] ?? null,
  hotPlateDepthMm: identity.hotPlateMm?.[1] ?? null,
  heightMm: identity.heightMm,
  maxTemperatureC: identity.maxTemperatureC,
  leadsOhm: identity.leadsOhm,
  sealing: identity.sealing,
  acResistanceOhm: identity.acResistanceOhm,
  acResistanceAtC: identity.acResistanceAtC,
});

export async function listVendors(): Promise<(VendorRecord & { readonly modules: number })[]> {
  const [vendors, modules] = await Promise.all([Vendor.findAll({ order: ['name'] }), Module.findAll({ attributes: ['vendorId'] })]);
  return vendors.map(({ id, name }) => ({ id, name, modules: modules.filter((row) => row.vendorId === id).length }));
}

export async function findVendor(id: number): Promise<VendorRecord | null> {
  const vendor = await Vendor.findByPk(id);
  return vendor && { id: vendor.id, name: vendor.name };
}

/** The vendor of this name, made when there is none. Call it inside a transaction. */
export async function vendorNamed(name: string): Promise<VendorRecord> {
  const vendor = (await Vendor.findOne({ where: { name } })) ?? (await Vendor.create({ name }));
  return { id: vendor.id, name: vendor.name };
}

export async function findModule(id: number): Promise<ModuleRecord | null> {
  const row = await Module.findByPk(id, whole);
  return row && toModule(row);
}

export async function listModules(where: { readonly vendorId?: number } = {}): Promise<ModuleRecord[]> {
  return (await Module.findAll({ where, ...whole, order: ['partNumber', 'variant'] })).map(toModule);
}

export async function findModuleByIdentity(
  vendorId: number,
  partNumber: string,
  variant: string,
  except = 0,
): Promise<ModuleRecord | null> {
  const row = await Module.findOne({ where: { vendorId, partNumber, variant, id: { [Op.ne]: except } }, ...whole });
  return row && toModule(row);
}

async function replaceRatings(moduleId: number, ratings: readonly RatingView[]): Promise<void> {
  await Rating.destroy({ where: { moduleId } });
  await Rating.bulkCreate(ratings.map((rating) => ({ ...rating, moduleId })));
}

export async function createModule(vendorId: number, body: ModuleBody): Promise<number> {
  const row = await Module.create({ vendorId, ...columns(body) });
  await replaceRatings(row.id, body.ratings);
  return row.id;
}

/** Writes over `version` and no other; false when somebody was quicker. */
export async function updateModule(id: number, version: number, vendorId: number, body: ModuleBody): Promise<boolean> {
  const [changed] = await Module.update({ vendorId, ...columns(body), version: version + 1 }, { where: { id, version } });
  if (changed === 1) await replaceRatings(id, body.ratings);
  return changed === 1;
}

/** How many readings stand on a module, by state. */
export async function readingStatesOf(moduleId: number): Promise<string[]> {
  return (await Reading.findAll({ where: { moduleId }, attributes: ['state'] })).map((row) => row.state);
}

/** The states of the readings that stand on each of these modules. */
export async function readingStatesByModule(moduleIds: readonly number[]): Promise<Map<number, ReadingState[]>> {
  const rows = await Reading.findAll({ where: { moduleId: { [Op.in]: [...moduleIds] } }, attributes: ['moduleId', 'state'] });
  return new Map(moduleIds.map((id) => [id, rows.filter((row) => row.moduleId === id).map((row) => row.state)]));
}
