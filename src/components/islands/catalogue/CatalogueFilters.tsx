import type { RefObject } from 'react';
import type { Texts } from '../shared/address';
import { PlainField } from '../shared/PlainField';

export interface Vendor {
  readonly id: number;
  readonly name: string;
}

type Option = readonly [value: string, label: string];

const STAGES: readonly Option[] = [
  ['1', 'one'],
  ['2', 'two'],
  ['3', 'three or more'],
];
const GRADES: readonly Option[] = [
  ['measured', 'measured'],
  ['curves', 'curves'],
  ['ratings', 'ratings'],
];

interface ChoiceProps {
  name: string;
  label: string;
  all: string;
  options: readonly Option[];
  value: string | undefined;
}

const Choice = ({ name, label, all, options, value }: ChoiceProps) => (
  <div className="field">
    <label className="label" htmlFor={`filter-${name}`}>
      {label}
    </label>
    <select className="select" id={`filter-${name}`} name={name} defaultValue={value ?? ''}>
      <option value="">{all}</option>
      {options.map(([id, text]) => (
        <option key={id} value={id}>
          {text}
        </option>
      ))}
    </select>
  </div>
);

interface RangeProps {
  label: string;
  name: string;
  unit: string;
  texts: Texts;
  problems: Texts;
}

/** From and to of one number. */
const Range = ({ label, name, unit, texts, problems }: RangeProps) => (
  <fieldset className="field">
    <legend className="label mb-1">{label}</legend>
    <div className="flex items-start gap-2">
      {(['From', 'To'] as const).map((end) => (
        <PlainField
          key={end}
          id={`filter-${name}${end}`}
          name={name + end}
          label={`${label} ${end.toLowerCase()}`}
          hideLabel
          unit={unit}
          value={texts[name + end]}
          error={problems[name + end]}
          size={6}
        />
      ))}
    </div>
  </fieldset>
);

interface Props {
  form: RefObject<HTMLFormElement | null>;
  texts: Texts;
  problems: Texts;
  vendors: readonly Vendor[];
  onInput: () => void;
  onSubmit: (event: { preventDefault: () => void }) => void;
}

/** What is kept through the form although it is not typed into it. */
const KEPT = ['sort', 'order', 'unstated'];

/** Filters as a plain form: it works by its button, and by itself once the page listens. */
export function CatalogueFilters({ form, texts, problems, vendors, onInput, onSubmit }: Props) {
  return (
    <form
      ref={form}
      className="sheet mb-4 grid grid-cols-2 items-start gap-x-4 gap-y-3 p-4 md:grid-cols-[minmax(11rem,1.6fr)_minmax(8rem,1fr)_auto_auto_minmax(6rem,.7fr)_minmax(6rem,.7fr)_auto]"
      action="/catalogue"
      role="search"
      aria-label="Filter the catalogue"
      onInput={onInput}
      onSubmit={onSubmit}
    >
      <div className="field col-span-2 md:col-span-1">
        <label className="label" htmlFor="filter-q">
          Words or part number
        </label>
        <input
          className="input"
          type="search"
          id="filter-q"
          name="q"
          maxLength={120}
          defaultValue={texts.q}
          autoComplete="off"
          spellCheck={false}
        />
        {problems.q && <span className="error">{problems.q}</span>}
      </div>
      <Choice name="vendor" label="Vendor" all="all" options={vendors.map(({ id, name }) => [String(id), name])} value={texts.vendor} />
      <div className="order-last col-span-2 flex flex-wrap gap-x-4 gap-y-3 md:order-none md:contents">
        <Range label="Qmax, from and to" name="heat" unit="W" texts={texts} problems={problems} />
        <Range label="Plate side, from and to" name="side" unit="mm" texts={texts} problems={problems} />
      </div>
      <Choice name="stages" label="Stages" all="any" options={STAGES} value={texts.stages} />
      <Choice name="grade" label="Rests on" all="anything" options={GRADES} value={texts.grade} />
      {KEPT.map((name) => texts[name] && <input key={`${name}-${texts[name]}`} type="hidden" name={name} defaultValue={texts[name]} />)}
      <div className="order-last flex gap-2 self-end md:order-none">
        <button type="submit" className="btn">
          Filter
        </button>
      </div>
    </form>
  );
}
