import { useRef } from 'react';
import { Plot } from '@/components/plot';
import { ErrorBoundary } from '@/components/ui/ErrorBoundary';
import { parseDuty, type CandidateModel } from '@/lib/duty';
import { formatWithUnit, parseNumber } from '@/lib/units';
import { addressOf, isPlainClick, type Texts } from '../shared/address';
import { PlainField } from '../shared/PlainField';
import { useAddress } from '../shared/use-address';
import { useLiveForm } from '../shared/use-live-form';
import { BAND_U, plotData, SHOW_NAMES, SHOWS, type Show } from './plot-data';

export interface ModuleCurvesProps {
  /** Address of the page, without what follows the question mark. */
  path: string;
  texts: Texts;
  model: CandidateModel;
  /** Currents of the curves, A. */
  currents: readonly number[];
  /** Hot side shown while none is asked for, °C. */
  hotSideC: number;
  /** Hot sides that the sheet itself draws, °C. */
  sheetSides: readonly number[];
}

const LIMITS = { unit: 'C', min: -100, max: 250 };
const celsius = (value: number) => formatWithUnit(value, 'C');

/** Performance of a module at any hot side, its state in the address; complete without a script, live with one. */
export function ModuleCurves(props: ModuleCurvesProps) {
  return (
    <ErrorBoundary>
      <Curves {...props} />
    </ErrorBoundary>
  );
}

const showOf = (text: string | undefined): Show => SHOWS.find((show) => show === text) ?? 'heat';

function Curves({ path, texts: drawnTexts, model, currents, hotSideC, sheetSides }: ModuleCurvesProps) {
  const { texts, generation, go } = useAddress(path, drawnTexts);
  const form = useRef<HTMLFormElement>(null);
  const live = useLiveForm(form, texts, (next) => go(next, 'replace'));
  const parsed = texts.hot === undefined ? ({ ok: true, value: hotSideC } as const) : parseNumber(texts.hot, LIMITS);
  const side = parsed.ok ? parsed.value : hotSideC;
  const show = showOf(texts.show);
  const duty = parseDuty({ heat: texts.heat, cold: texts.cold, hot: texts.hot }).duty;
  const data = plotData(model, side, currents, show, duty);
  return (
    <section className="sheet p-4" aria-labelledby="performance">
      <div className="mb-3 flex flex-wrap items-start gap-x-4 gap-y-2">
        <h2 id="performance" className="m-0 pt-1.5">
          {SHOW_NAMES[show]}
        </h2>
        <form key={generation} ref={form} action={path} aria-label="Hot side" className="flex flex-wrap items-start gap-2" {...live}>
          <PlainField
            id="hot-side"
            name="hot"
            label="hot side"
            unit="C"
            value={texts.hot ?? String(hotSideC)}
            error={parsed.ok ? undefined : parsed.message}
            row
            size={5}
          />
          {Object.entries(texts).map(
            ([name, text]) => name !== 'hot' && <input key={name + text} type="hidden" name={name} defaultValue={text} />,
          )}
          <noscript>
            <button type="submit" className="btn">
              Show
            </button>
          </noscript>
        </form>
        <p className="hint pt-2">{sideNote(side, model, sheetSides)}</p>
        <nav className="ml-auto flex gap-3 pt-1.5" aria-label="What to show">
          {SHOWS.map((one) => (
            <a
              key={one}
              className="tab py-0"
              aria-current={one === show ? 'true' : undefined}
              href={addressOf(path, texts, { show: one })}
              onClick={(event) => {
                if (!isPlainClick(event)) return;
                event.preventDefault();
                go({ ...texts, show: one }, 'push', true);
              }}
            >
              {one === 'cop' ? 'COP' : one}
            </a>
          ))}
        </nav>
      </div>
      <Plot {...data} title={`${SHOW_NAMES[show]} with the hot side at ${celsius(side)}`} hideTitle height={340} note={note(model)} />
    </section>
  );
}

const list = (values: readonly number[]) =>
  values
    .map(celsius)
    .join(', ')
    .replace(/, ([^,]*)$/, ' and $1');

/** How the hot side shown stands to those of the sheet. */
function sideNote(side: number, { validity: { hotSideC } }: CandidateModel, sheetSides: readonly number[]): string {
  const [low, high] = hotSideC;
  if (side < low || side > high) return `outside ${celsius(low)} to ${celsius(high)}, where the model holds`;
  if (sheetSides.some((one) => Math.abs(one - side) < 0.05)) return 'as the sheet draws it';
  return sheetSides.length === 0 ? '' : `the sheet draws ${list(sheetSides)}`;
}

function note({ tolerancePercent }: CandidateModel): string {
  const tolerance =
    tolerancePercent === null
      ? 'The sheet states no tolerance of a delivered module.'
      : `A delivered module may differ by ± ${formatWithUnit(tolerancePercent, '%')} (sheet).`;
  return `Bands: how well the drawing was read, ± ${BAND_U} standard uncertainties. ${tolerance}`;
}
