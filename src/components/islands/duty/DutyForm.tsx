import type { RefObject } from 'react';
import { DUTY_FIELDS, type DutyField, type DutyParam, type DutyTexts } from '@/lib/duty';
import { PlainField } from '../shared/PlainField';

const GROUPS: readonly { readonly title: string; readonly params: readonly DutyParam[] }[] = [
  { title: 'What must be done', params: ['heat', 'cold', 'hot'] },
  { title: 'What the supply gives', params: ['current', 'voltage'] },
  { title: 'Air around the cold face', params: ['air', 'humidity'] },
];

const fieldOf = (param: DutyParam): DutyField => DUTY_FIELDS.find((field) => field.param === param)!;

interface Props {
  form: RefObject<HTMLFormElement | null>;
  texts: DutyTexts;
  problems: Readonly<Partial<Record<DutyParam, string>>>;
  /** Module that the duty was started from, kept in the address. */
  module: string | undefined;
  onInput: () => void;
  onSubmit: (event: { preventDefault: () => void }) => void;
  onLeave: () => void;
}

/** The duty as a plain form: it works by its button, and answers while one types once the page listens. */
export function DutyForm({ form, texts, problems, module, onInput, onSubmit, onLeave }: Props) {
  return (
    <form ref={form} className="sheet flex flex-col gap-4 p-4" action="/duty" aria-label="Duty" onInput={onInput} onSubmit={onSubmit}>
      {GROUPS.map(({ title, params }) => (
        <fieldset key={title} className="flex flex-col gap-2">
          <legend className="mb-2 font-semibold">{title}</legend>
          {params.map((param) => {
            const { label, unit } = fieldOf(param);
            return (
              <PlainField
                key={param}
                id={`duty-${param}`}
                name={param}
                label={label}
                unit={unit}
                value={texts[param]}
                error={problems[param]}
                row
                onBlur={onLeave}
              />
            );
          })}
        </fieldset>
      ))}
      {module && <input type="hidden" name="module" defaultValue={module} />}
      <button type="submit" className="btn btn-primary">
        Find modules
      </button>
    </form>
  );
}
