import { NativeSelect } from '@/components/ui/NativeSelect';
import { usualUnit, type BenchAxis, type BenchFamily } from '@/lib/editor';
import type { Quantity } from '@/lib/units';
import { QUANTITY_CHOICES, unitChoiceOf, unitChoices, unitOfChoice } from './choices';

const SCALES = [
  { id: 'linear', label: 'linear' },
  { id: 'log', label: 'logarithmic' },
] as const;

export interface AxisFieldsProps {
  /** "x axis", "curves by". */
  readonly name: string;
  readonly value: BenchAxis | BenchFamily;
  readonly onChange: (to: Partial<BenchAxis>) => void;
  readonly disabled: boolean;
}

/** Quantity and unit of an axis or of the family, and an axis's scale. */
export function AxisFields({ name, value, onChange, disabled }: AxisFieldsProps) {
  return (
    <fieldset className="bench-axis" disabled={disabled}>
      <legend className="label">{name}</legend>
      <NativeSelect<Quantity>
        label={`${name}: quantity`}
        hideLabel
        choices={QUANTITY_CHOICES}
        value={value.quantity}
        onChange={(quantity) => onChange({ quantity, unit: usualUnit(quantity) })}
        placeholder="Choose"
      />
      <NativeSelect<string>
        label={`${name}: unit`}
        hideLabel
        choices={unitChoices(value.quantity)}
        value={unitChoiceOf(value)}
        onChange={(choice) => onChange(unitOfChoice(choice))}
        placeholder="unit"
        isDisabled={!value.quantity}
      />
      {'scale' in value && (
        <NativeSelect<'linear' | 'log'>
          label={`${name}: scale`}
          hideLabel
          choices={SCALES}
          value={value.scale}
          onChange={(scale) => onChange({ scale })}
        />
      )}
    </fieldset>
  );
}
