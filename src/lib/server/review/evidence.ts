import { approvedReadingOf, latestModel, type ReadingRecord } from '@db';
import { can } from '@/lib/access';
import type { ChangeRow, EvidenceView, ModelAnswer } from '@/lib/contracts';
import type { BenchDocument } from '@/lib/editor';
import type { ReadingModel, ReadingModule } from '@/lib/reading';
import { canonicalHash } from '../hash';
import type { SignedInPerson } from '../people';
import { accessOf, fitDraft, ratingsBeside, readingFor, readingView, toModelAnswer, toReadingModule } from '../readings';
import { Refusal } from '../refusal';
import { storedModel } from './model-hash';

const FIGURES = [
  { what: 'Seebeck coefficient α', unit: 'V/K', of: (model: ReadingModel) => model.alpha },
  { what: 'Resistance R', unit: 'Ω', of: (model: ReadingModel) => model.R },
  { what: 'Conductance K', unit: 'W/K', of: (model: ReadingModel) => model.K },
] as const;

/** α, R, K and the ratings at each shared hot side, of the model that stands and of the one that asks to. */
function changes(before: ReadingModel | null, after: ReadingModel | null): ChangeRow[] {
  const figures = FIGURES.map(({ what, unit, of }) => ({
    what,
    unit,
    before: before ? of(before).value : null,
    after: after ? of(after).value : null,
    u: after ? of(after).u : null,
  }));
  const ratings = (after?.derived ?? []).flatMap((now) => {
    const then = before?.derived.find((row) => row.hotSideC === now.hotSideC);
    const row = (what: string, key: 'qmaxW' | 'dTmaxK' | 'vmaxV' | 'imaxLargestDeltaT', unit: string) => ({
      what: `${what} at ${now.hotSideC}\u00A0°C`,
      unit,
      before: then?.[key].value ?? null,
      after: now[key].value,
      u: now[key].u,
    });
    return [row('Imax', 'imaxLargestDeltaT', 'A'), row('Vmax', 'vmaxV', 'V'), row('Qmax', 'qmaxW', 'W'), row('ΔTmax', 'dTmaxK', 'K')];
  });
  return [...figures, ...ratings];
}

const NO_ANSWER: ModelAnswer = { result: null, fit: null, residuals: [], curves: [], ratings: [], problems: [] };

/** The answer about a draft; what keeps it from being read is a problem to show, not a refusal of the page. */
async function answerFor(reading: ReadingRecord, draft: BenchDocument, asHandedIn: ReadingModule | undefined): Promise<ModelAnswer> {
  try {
    return toModelAnswer(draft, reading.module, await fitDraft(reading, draft, asHandedIn));
  } catch (error) {
    if (!(error instanceof Refusal) || error.status !== 422) throw error;
    return { ...NO_ANSWER, ratings: ratingsBeside(reading.module, null), problems: [{ chart: null, text: error.message }] };
  }
}

/** What of a module is another now than when the reading was handed in. */
export function moduleChanges(asHandedIn: ReadingModule, now: ReadingModule): string[] {
  const differs = (key: keyof ReadingModule) => canonicalHash(asHandedIn[key] ?? null) !== canonicalHash(now[key] ?? null);
  return MODULE_WORDS.filter(([key]) => differs(key)).map(([, words]) => words);
}

const MODULE_WORDS = [
  ['vendor', 'vendor'],
  ['partNumber', 'part number'],
  ['variant', 'variant'],
  ['stages', 'stages'],
  ['couples', 'couples'],
  ['coldPlateMm', 'cold plate'],
  ['hotPlateMm', 'hot plate'],
  ['heightMm', 'height'],
  ['maxTemperatureC', 'highest temperature'],
  ['leadsOhm', 'lead resistance'],
  ['rated', 'ratings'],
  ['acResistanceOhm', 'AC resistance'],
  ['acResistanceAtC', 'temperature of the AC resistance'],
] as const satisfies readonly (readonly [keyof ReadingModule, string])[];

/** The model in the catalogue now beside this one; null where this one is it, or where there is none. */
async function againstApproved(reading: ReadingRecord, after: ReadingModel | null): Promise<EvidenceView['approved']> {
  const standing = await approvedReadingOf(reading.module.id);
  const model = standing && standing.id !== reading.id ? await latestModel(standing.id) : null;
  return model ? { readingId: model.readingId, changes: changes(storedModel(model).result.model, after) } : null;
}

/**
 * What was handed in or decided on, with all that a decision needs: fitted again from the very draft with the module as it
 * was handed in, beside the frozen result and its hash. A draft is shown as it stands.
 */
export async function evidence(actor: SignedInPerson, id: number): Promise<EvidenceView> {
  const reading = await readingFor(actor, id);
  const draft = JSON.parse(reading.document) as BenchDocument;
  const model = reading.state === 'draft' ? null : await latestModel(id);
  const frozen = model && storedModel(model);
  const [view, answer] = await Promise.all([readingView(actor, id), answerFor(reading, draft, frozen?.document.module)]);
  const result = frozen?.result ?? answer.result;
  const access = accessOf(reading);
  return {
    reading: view,
    model: { ...answer, result },
    hash: model?.hash ?? null,
    handedInAt: view.decisions.findLast((decision) => decision.what === 'handed-in')?.at ?? null,
    mayDecide: can(actor, 'reading.decide', access),
    ownWork: access.ownerId === actor.id || Boolean(access.editorIds?.includes(actor.id)),
    moduleChanged: frozen ? moduleChanges(frozen.document.module, toReadingModule(reading.module)) : [],
    approved: await againstApproved(reading, result?.model ?? null),
  };
}
