import { approvedReadingOf, latestModel } from '@db';
import type { ChangeRow, EvidenceView } from '@/lib/contracts';
import type { BenchDocument } from '@/lib/editor';
import type { ReadingModel, ReadingResult } from '@/lib/reading';
import type { SignedInPerson } from '../people';
import { fitDraft, readingFor, readingView, toModelAnswer } from '../readings';

const resultOf = (text: string) => JSON.parse(text) as ReadingResult;

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
      what: `${what} at ${now.hotSideC} °C`,
      unit,
      before: then?.[key].value ?? null,
      after: now[key].value,
      u: now[key].u,
    });
    return [row('Imax', 'imaxLargestDeltaT', 'A'), row('Vmax', 'vmaxV', 'V'), row('Qmax', 'qmaxW', 'W'), row('ΔTmax', 'dTmaxK', 'K')];
  });
  return [...figures, ...ratings];
}

/** What was handed in or decided on, with all that a decision needs: refitted from the very draft, beside its frozen hash. */
export async function evidence(actor: SignedInPerson, id: number): Promise<EvidenceView> {
  const reading = await readingFor(actor, id);
  const draft = JSON.parse(reading.document) as BenchDocument;
  const [view, fitted, model, standing] = await Promise.all([
    readingView(actor, id),
    fitDraft(reading, draft),
    latestModel(id),
    approvedReadingOf(reading.module.id),
  ]);
  const frozen = model ? resultOf(model.result) : null;
  const answer = toModelAnswer(draft, reading.module, fitted);
  const standingModel = standing && standing.id !== id ? await latestModel(standing.id) : null;
  return {
    reading: view,
    model: frozen ? { ...answer, result: frozen } : answer,
    hash: model?.hash ?? null,
    handedInAt: view.decisions.findLast((decision) => decision.what === 'handed-in')?.at ?? null,
    approved: standingModel
      ? { readingId: standingModel.readingId, changes: changes(resultOf(standingModel.result).model, frozen?.model ?? null) }
      : null,
  };
}
