import { Op, type WhereOptions } from 'sequelize';
import {
  Decision,
  FittedModel,
  Module,
  Rating,
  Reading,
  ReadingEditor,
  ReadingPicture,
  Sheet,
  User,
  Vendor,
  type DecisionKind,
  type ReadingState,
} from '../models';
import { toModule, type ModuleRecord } from './parts';

export interface ReadingRecord {
  readonly id: number;
  readonly module: ModuleRecord;
  readonly sheetId: number;
  readonly owner: { readonly id: string; readonly name: string };
  readonly state: ReadingState;
  readonly version: number;
  /** Bench document, JSON text. */
  readonly document: string;
  readonly savedBy: { readonly id: string; readonly name: string };
  readonly savedAt: Date;
  readonly createdAt: Date;
  readonly editorIds: readonly string[];
}

export interface DecisionRecord {
  readonly what: DecisionKind;
  readonly reason: string;
  readonly by: { readonly id: string; readonly name: string };
  readonly at: Date;
  readonly readingId: number;
}

export interface ModelRecord {
  readonly id: number;
  readonly readingId: number;
  readonly moduleId: number;
  /** Reading document, JSON text. */
  readonly document: string;
  /** Result, JSON text. */
  readonly result: string;
  readonly engine: string;
  readonly hash: string;
  readonly createdAt: Date;
}

const whole = {
  include: [
    {
      model: Module,
      as: 'module',
      include: [
        { model: Vendor, as: 'vendor' },
        { model: Rating, as: 'ratings' },
      ],
    },
    { model: User, as: 'owner' },
    { model: User, as: 'saver' },
    { model: ReadingEditor, as: 'editors' },
  ],
};

const named = (user: User | undefined, id: string) => ({ id, name: user?.name ?? '' });

const toReading = (row: Reading): ReadingRecord => ({
  id: row.id,
  module: toModule(row.module!),
  sheetId: row.sheetId,
  owner: named(row.owner, row.ownerId),
  state: row.state,
  version: row.version,
  document: row.document,
  savedBy: named(row.saver, row.savedBy),
  savedAt: row.savedAt,
  createdAt: row.createdAt,
  editorIds: (row.editors ?? []).map((editor) => editor.userId),
});

const toDecision = (row: Decision): DecisionRecord => ({
  what: row.what,
  reason: row.reason ?? '',
  by: named(row.user, row.userId),
  at: row.createdAt,
  readingId: row.readingId,
});

const toModel = (row: FittedModel): ModelRecord => ({
  id: row.id,
  readingId: row.readingId,
  moduleId: row.moduleId,
  document: row.document,
  result: row.result,
  engine: row.engine,
  hash: row.hash,
  createdAt: row.createdAt,
});

export async function findReading(id: number): Promise<ReadingRecord | null> {
  const row = await Reading.findByPk(id, whole);
  return row && toReading(row);
}

export async function listReadings(filter: {
  readonly ownerId?: string;
  readonly states?: readonly ReadingState[];
  readonly moduleId?: number;
}): Promise<ReadingRecord[]> {
  const where: WhereOptions = {
    ...(filter.ownerId === undefined ? {} : { ownerId: filter.ownerId }),
    ...(filter.moduleId === undefined ? {} : { moduleId: filter.moduleId }),
    ...(filter.states === undefined ? {} : { state: { [Op.in]: [...filter.states] } }),
  };
  return (
    await Reading.findAll({
      where,
      ...whole,
      order: [
        ['savedAt', 'DESC'],
        ['id', 'DESC'],
      ],
    })
  ).map(toReading);
}

export const countReadings = (states: readonly ReadingState[]): Promise<number> =>
  Reading.count({ where: { state: { [Op.in]: [...states] } } });

export async function createReading(reading: {
  readonly moduleId: number;
  readonly sheetId: number;
  readonly ownerId: string;
  readonly document: string;
}): Promise<number> {
  const row = await Reading.create({ ...reading, state: 'draft', savedBy: reading.ownerId, savedAt: new Date() });
  return row.id;
}

/** Writes over `version` of a reading in one of `states`, and no other; false when somebody was quicker. */
export async function saveDocument(save: {
  readonly id: number;
  readonly version: number;
  readonly document: string;
  readonly pictureIds: readonly number[];
  readonly userId: string;
  readonly state: ReadingState;
}): Promise<boolean> {
  const { id, version } = save;
  const values = { document: save.document, version: version + 1, savedBy: save.userId, savedAt: new Date(), state: save.state };
  const [changed] = await Reading.update(values, { where: { id, version, state: { [Op.in]: ['draft', 'returned'] } } });
  if (changed !== 1) return false;
  await addEditor(id, save.userId);
  await ReadingPicture.destroy({ where: { readingId: id } });
  await ReadingPicture.bulkCreate(save.pictureIds.map((pictureId) => ({ readingId: id, pictureId })));
  return true;
}

/** Moves a reading from one state to another; false when it was not there any more. */
export async function moveReading(id: number, version: number, from: ReadingState, to: ReadingState): Promise<boolean> {
  const [changed] = await Reading.update({ state: to, version: version + 1 }, { where: { id, version, state: from } });
  return changed === 1;
}

export async function addEditor(readingId: number, userId: string): Promise<void> {
  const there = await ReadingEditor.findOne({ where: { readingId, userId } });
  if (!there) await ReadingEditor.create({ readingId, userId });
}

export async function addDecision(decision: {
  readonly readingId: number;
  readonly what: DecisionKind;
  readonly reason: string;
  readonly userId: string;
  readonly modelId: number | null;
}): Promise<void> {
  await Decision.create(decision);
}

export async function decisionsOf(readingIds: readonly number[]): Promise<DecisionRecord[]> {
  const rows = await Decision.findAll({
    where: { readingId: { [Op.in]: [...readingIds] } },
    include: [{ model: User, as: 'user' }],
    order: ['id'],
  });
  return rows.map(toDecision);
}

/** Newest approvals of readings that are approved still. */
export async function recentApprovals(limit: number): Promise<DecisionRecord[]> {
  const rows = await Decision.findAll({
    where: { what: 'approved' },
    include: [
      { model: User, as: 'user' },
      { model: Reading, as: 'reading', attributes: [], where: { state: 'approved' } },
    ],
    order: [['id', 'DESC']],
    limit,
  });
  return rows.map(toDecision);
}

export async function createModel(model: {
  readonly readingId: number;
  readonly moduleId: number;
  readonly document: string;
  readonly result: string;
  readonly engine: string;
  readonly hash: string;
}): Promise<number> {
  return (await FittedModel.create(model)).id;
}

/** Models by number, from the one after `id` on. */
export async function modelsAfter(id: number, limit: number): Promise<ModelRecord[]> {
  return (await FittedModel.findAll({ where: { id: { [Op.gt]: id } }, order: ['id'], limit })).map(toModel);
}

/** The model that the last approval of a reading named; null when it was never approved. */
export async function approvedModelId(readingId: number): Promise<number | null> {
  const row = await Decision.findOne({ where: { readingId, what: 'approved' }, order: [['id', 'DESC']] });
  return row?.modelId ?? null;
}

/** The newest model of a reading. */
export async function latestModel(readingId: number): Promise<ModelRecord | null> {
  const row = await FittedModel.findOne({ where: { readingId }, order: [['id', 'DESC']] });
  return row && toModel(row);
}

export async function approvedReadingOf(moduleId: number): Promise<ReadingRecord | null> {
  const row = await Reading.findOne({ where: { moduleId, state: 'approved' }, ...whole });
  return row && toReading(row);
}

/** Every approved reading with its newest model: what the catalogue and the search stand on. */
export async function approvedModels(): Promise<{ reading: ReadingRecord; model: ModelRecord }[]> {
  return modelsInStates(['approved']);
}

/** Readings in the given states with their newest models, oldest reading first. */
export async function modelsInStates(states: readonly ReadingState[]): Promise<{ reading: ReadingRecord; model: ModelRecord }[]> {
  const readings = await Reading.findAll({ where: { state: { [Op.in]: [...states] } }, ...whole, order: ['id'] });
  const models = await FittedModel.findAll({ where: { readingId: { [Op.in]: readings.map((row) => row.id) } }, order: ['id'] });
  const newest = new Map(models.map((row) => [row.readingId, row]));
  return readings.flatMap((row) => {
    const model = newest.get(row.id);
    return model ? [{ reading: toReading(row), model: toModel(model) }] : [];
  });
}

export async function sheetNames(ids: readonly number[]): Promise<Map<number, { title: string; number: string; revision: string }>> {
  const rows = await Sheet.findAll({ where: { id: { [Op.in]: [...ids] } } });
  return new Map(rows.map((row) => [row.id, { title: row.title ?? '', number: row.number ?? '', revision: row.revision ?? '' }]));
}
