import { TextField } from '@/components/ui/TextField';
import type { ModuleDraft, PlateDraft } from './module-draft';
import { NumberField } from './NumberField';
import type { Form } from './use-form';

type NumberKey = 'stages' | 'couples' | 'heightMm' | 'maxTemperatureC' | 'leadsOhm' | 'acResistanceOhm' | 'acResistanceAtC';

interface NumberSpec {
  readonly key: NumberKey;
  readonly label: string;
  readonly unit?: string;
  readonly description?: string;
}

const BODY: readonly NumberSpec[] = [
  { key: 'stages', label: 'Stages' },
  { key: 'couples', label: 'Couples' },
];
const MORE: readonly NumberSpec[] = [
  { key: 'heightMm', label: 'Height', unit: 'mm' },
  { key: 'maxTemperatureC', label: 'Highest temperature', unit: 'C' },
  { key: 'leadsOhm', label: 'Resistance of the leads', unit: 'ohm', description: 'Both leads together, where it is printed.' },
];
const AC: readonly NumberSpec[] = [
  { key: 'acResistanceOhm', label: 'AC resistance', unit: 'ohm' },
  { key: 'acResistanceAtC', label: 'AC resistance measured at', unit: 'C' },
];

/** Identity of a module as printed, apart from its vendor and its ratings. */
export function ModuleFields({ form }: { form: Form<ModuleDraft> }) {
  const { values, problems, prefix, change } = form;
  const numbers = (specs: readonly NumberSpec[]) =>
    specs.map(({ key, ...spec }) => (
      <NumberField key={key} form={form} name={key} {...spec} value={values[key]} onChange={(value) => change({ [key]: value }, true)} />
    ));
  const text = (key: 'partNumber' | 'variant' | 'sealing', label: string, description: string, autoFocus = false) => (
    <TextField
      id={prefix + key}
      label={label}
      description={description}
      error={problems[key]}
      value={values[key]}
      onChange={(typed) => change({ [key]: typed })}
      autoComplete="off"
      spellCheck="false"
      autoFocus={autoFocus}
    />
  );
  return (
    <>
      <div className="grid grid-cols-2 gap-4 lg:grid-cols-4">
        {text('partNumber', 'Part number', 'As printed.', true)}
        {text('variant', 'Variant', 'Sealing, leads or height grade, where they make another part.')}
        {numbers(BODY)}
        <Plate
          form={form}
          name="coldPlateMm"
          label="Cold plate"
          value={values.coldPlateMm}
          onChange={(coldPlateMm) => change({ coldPlateMm })}
        />
        <Plate
          form={form}
          name="hotPlateMm"
          label="Hot plate"
          value={values.hotPlateMm}
          onChange={(hotPlateMm) => change({ hotPlateMm })}
        />
        {numbers(MORE)}
        {text('sealing', 'Sealing', 'Silicone, epoxy, none …')}
        {numbers(AC)}
      </div>
    </>
  );
}

interface PlateProps {
  form: Form<ModuleDraft>;
  name: 'coldPlateMm' | 'hotPlateMm';
  label: string;
  value: PlateDraft;
  onChange: (value: PlateDraft) => void;
}

function Plate({ form, name, label, value: [width, depth], onChange }: PlateProps) {
  return (
    <div role="group" aria-label={label} className="col-span-2 grid grid-cols-2 content-start gap-2 sm:col-span-1">
      <NumberField
        form={form}
        name={`${name}[0]`}
        label={`${label} width`}
        unit="mm"
        size={3}
        value={width}
        onChange={(next) => onChange([next, depth])}
      />
      <NumberField
        form={form}
        name={`${name}[1]`}
        label={`${label} depth`}
        unit="mm"
        size={3}
        value={depth}
        onChange={(next) => onChange([width, next])}
      />
    </div>
  );
}
