import type { Rating } from '@/lib/contracts';
import { exact } from '@/components/sheets/words';
import { Button } from '@/components/ui/Button';
import { NativeSelect } from '@/components/ui/NativeSelect';
import { nextRating, type ModuleDraft, type RatingDraft } from './module-draft';
import { NumberField } from './NumberField';
import { ATMOSPHERE, BASIS, IMAX_MEANS, meaningOf, RATED, type Meaning } from './rating-words';
import type { Form } from './use-form';
import { focusSoon } from './use-page';

const MOST_HOT_SIDES = 12;

/** Ratings as printed, a block for each hot side. */
export function RatingFields({ form }: { form: Form<ModuleDraft> }) {
  const { ratings } = form.values;
  const set = (key: number, next: Partial<RatingDraft>) =>
    form.change({ ratings: ratings.map((rating) => (rating.key === key ? { ...rating, ...next } : rating)) });
  const add = () => {
    const next = nextRating(ratings);
    form.change({ ratings: [...ratings, next] });
    focusSoon(`${form.prefix}ratings[${next.key}].hotSideC`);
  };
  const remove = (key: number) => {
    form.fault(`ratings[${key}]`, null);
    form.change({ ratings: ratings.filter((rating) => rating.key !== key) });
    focusSoon(`${form.prefix}ratings`);
  };
  const problem = form.problems.ratings;
  return (
    <fieldset id={`${form.prefix}ratings`} tabIndex={-1} className="mt-5 border-t border-line pt-3">
      <legend className="float-left mb-1 w-full">
        <h4 className="text-[0.9375rem] font-semibold">Ratings as printed</h4>
      </legend>
      <p className="hint clear-both">One block for each hot side of the sheet. Leave empty what it does not state.</p>
      {problem && <p className="error">{problem}</p>}
      {ratings.map((rating, at) => (
        <HotSide
          key={rating.key}
          form={form}
          rating={rating}
          at={at}
          onChange={(next) => set(rating.key, next)}
          onRemove={ratings.length > 1 ? () => remove(rating.key) : undefined}
        />
      ))}
      {ratings.length < MOST_HOT_SIDES && (
        <Button size="small" className="mt-3" onPress={add}>
          Add a hot side
        </Button>
      )}
    </fieldset>
  );
}

interface HotSideProps {
  form: Form<ModuleDraft>;
  rating: RatingDraft;
  at: number;
  onChange: (next: Partial<RatingDraft>) => void;
  onRemove: (() => void) | undefined;
}

type RatedKey = keyof typeof RATED;
const NUMBERS: readonly (readonly [key: RatedKey, label: string, unit: string])[] = [
  ['hotSideC', 'Hot side', 'C'],
  ['imaxA', 'Imax', 'A'],
  ['vmaxV', 'Vmax', 'V'],
  ['qmaxW', 'Qmax', 'W'],
  ['dTmaxK', 'ΔTmax', 'K'],
];

function HotSide({ form, rating, at, onChange, onRemove }: HotSideProps) {
  const name = rating.hotSideC === null ? `Hot side ${at + 1}` : `At ${exact(rating.hotSideC, 'C')}`;
  const number = (key: RatedKey, label: string, unit: string) => (
    <NumberField
      key={key}
      form={form}
      name={`ratings[${rating.key}].${key}`}
      label={label}
      unit={unit}
      description={RATED[key]}
      size={5}
      value={rating[key]}
      onChange={(value) => onChange({ [key]: value })}
    />
  );
  return (
    <fieldset className="mt-3 border-l-2 border-line pl-3">
      <legend className="float-left font-semibold">{name}</legend>
      {onRemove && (
        <Button size="small" variant="quiet" className="float-right" aria-label={`Remove ${name}`} onPress={onRemove}>
          Remove
        </Button>
      )}
      <div className="clear-both grid grid-cols-2 gap-3 pt-1 lg:grid-cols-5">{NUMBERS.map((spec) => number(...spec))}</div>
      <div className="grid gap-3 pt-3 sm:grid-cols-2 lg:grid-cols-4">
        <MeaningSelect<Rating['imaxMeans']>
          label="Imax means"
          choices={IMAX_MEANS}
          value={rating.imaxMeans}
          onChange={(imaxMeans) => onChange({ imaxMeans })}
        />
        <MeaningSelect<Rating['basis']> label="Basis" choices={BASIS} value={rating.basis} onChange={(basis) => onChange({ basis })} />
        <MeaningSelect<Rating['atmosphere']>
          label="Atmosphere"
          choices={ATMOSPHERE}
          value={rating.atmosphere}
          onChange={(atmosphere) => onChange({ atmosphere })}
        />
        {number('tolerancePercent', 'Tolerance, ±', '%')}
      </div>
    </fieldset>
  );
}

interface MeaningProps<Id extends string> {
  label: string;
  choices: readonly Meaning<Id>[];
  value: Id;
  onChange: (id: Id) => void;
}

/** A choice with what the trade means by the chosen one. */
const MeaningSelect = <Id extends string>({ label, choices, value, onChange }: MeaningProps<Id>) => (
  <NativeSelect label={label} choices={choices} value={value} onChange={onChange} description={meaningOf(choices, value)} />
);
