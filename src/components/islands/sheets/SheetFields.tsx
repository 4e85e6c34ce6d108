import { TextField } from '@/components/ui/TextField';
import { readDate } from '@/components/sheets/dates';
import type { SheetDraft } from './sheet-draft';
import type { Form } from './use-form';
import { VendorField } from './VendorField';

interface Props {
  form: Form<SheetDraft>;
  vendors: readonly string[];
}

type TextKey = Exclude<keyof SheetDraft, 'vendor'>;

const FIELDS: readonly { readonly key: TextKey; readonly label: string; readonly description: string; readonly wide?: boolean }[] = [
  { key: 'title', label: 'Title', description: 'What stands at its head.', wide: true },
  { key: 'number', label: 'Number', description: 'The vendor’s number of the sheet.' },
  { key: 'revision', label: 'Revision', description: 'Letter, number or edition.' },
  { key: 'dated', label: 'Date of the sheet', description: 'As far as it is printed: 2026-03-15, 2026-03 or 2026.' },
  { key: 'obtainedOn', label: 'Obtained on', description: 'The day it came to you, like 2026-03-15.' },
  {
    key: 'obtainedFrom',
    label: 'Obtained from',
    description: 'An address on the web, a person, an order: where another can find it.',
    wide: true,
  },
];

const DATES = new Set<TextKey>(['dated', 'obtainedOn']);

/** Identity of a sheet. Only the vendor must be there; empty means that the sheet does not say. */
export function SheetFields({ form, vendors }: Props) {
  const { values, problems, prefix, change } = form;
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <div className="sm:col-span-2">
        <VendorField
          id={`${prefix}vendor`}
          value={values.vendor}
          vendors={vendors}
          onChange={(vendor) => change({ vendor })}
          error={problems.vendor}
        />
      </div>
      {FIELDS.map(({ key, label, description, wide }) => (
        <TextField
          key={key}
          id={prefix + key}
          label={label}
          description={description}
          error={problems[key]}
          value={values[key]}
          onChange={(text) => change({ [key]: text })}
          onBlur={() => DATES.has(key) && change({ [key]: readDate(values[key]) }, true)}
          autoComplete="off"
          spellCheck={key === 'title' ? undefined : 'false'}
          className={wide ? 'sm:col-span-2' : ''}
        />
      ))}
    </div>
  );
}
