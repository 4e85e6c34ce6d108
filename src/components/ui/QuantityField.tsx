import { useEffect, useState } from 'react';
import { Input } from 'react-aria-components/Input';
import { TextField } from 'react-aria-components/TextField';
import { parseNumber, unitSymbol } from '@/lib/units';
import { FieldLabel, FieldNotes, fieldClass, type FieldProps } from './Field';
import { afterPointer, watchPointer } from './pointer';
import { editableNumber, stepped } from './quantity-text';

export interface QuantityFieldProps extends FieldProps {
  /** In the unit of the field; null while nothing is stated. */
  value: number | null;
  /** Called with a good number, or with null when the field was emptied; never with a faulty entry. */
  onChange: (value: number | null) => void;
  /** Called with the sentence about a faulty entry, and with null when it is mended. */
  onFault?: (message: string | null) => void;
  /** Unit as @/lib/units spells it ("C", "K/W"); shown by its symbol. */
  unit?: string;
  min?: number;
  max?: number;
  /** The number must be larger than this. */
  above?: number;
  /** Significant digits shown when nobody is typing. */
  digits?: number;
  /** When true, an empty field is a fault. */
  required?: boolean;
  /** Up and down arrows step by this much, with Page keys by ten times as much. */
  step?: number;
  /** Report every good number while typing, not only on leaving the field or Enter. */
  live?: boolean;
  id?: string;
  name?: string;
  placeholder?: string;
  isDisabled?: boolean;
  isReadOnly?: boolean;
  autoFocus?: boolean;
  /** Width of the box in characters. */
  size?: number;
  className?: string;
}

const STEPS: Readonly<Record<string, number>> = { ArrowUp: 1, ArrowDown: -1, PageUp: 10, PageDown: -10 };

/** A typed number with its unit: decimal comma or point, spaces, any minus, exponents and the unit itself are taken as people write them. */
export function QuantityField(props: QuantityFieldProps) {
  const {
    label,
    description,
    error,
    row,
    hideLabel,
    unit,
    value,
    onChange,
    onFault,
    digits = 12,
    step,
    live = false,
    required,
    size = 8,
  } = props;
  const [draft, setDraft] = useState<string | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  const shown = draft ?? editableNumber(value, digits);

  useEffect(watchPointer, []);

  const settle = (sentence: string | null) => {
    afterPointer(() => setFault(sentence));
    if (sentence !== fault) onFault?.(sentence);
  };
  const take = (text: string, final: boolean) => {
    if (text.trim() === '') {
      if (final) settle(required ? `Enter ${label.charAt(0).toLowerCase()}${label.slice(1)}.` : null);
      if (value !== null) onChange(null);
      return final && setDraft(null);
    }
    const parsed = parseNumber(text, { unit, min: props.min, max: props.max, above: props.above });
    if (!parsed.ok) return final && settle(parsed.message);
    settle(null);
    if (parsed.value !== value) onChange(parsed.value);
    if (final) setDraft(null);
  };
  const type = (text: string) => {
    setDraft(text);
    if (fault !== null || live) take(text, false);
  };
  const onKeyDown = (event: React.KeyboardEvent) => {
    if (event.key === 'Enter' && draft !== null) take(draft, true);
    const steps = STEPS[event.key];
    if (step === undefined || steps === undefined) return;
    event.preventDefault();
    const now = parseNumber(shown, { unit });
    take(String(stepped(now.ok ? now.value : 0, step, steps)), true);
  };

  return (
    <TextField
      validationBehavior="aria"
      value={shown}
      onChange={type}
      onBlur={() => draft !== null && take(draft, true)}
      onKeyDown={onKeyDown}
      isInvalid={Boolean(error ?? fault)}
      isDisabled={props.isDisabled}
      isReadOnly={props.isReadOnly}
      autoFocus={props.autoFocus}
      id={props.id}
      name={props.name}
      className={fieldClass(row, props.className)}
    >
      <FieldLabel label={label} hideLabel={hideLabel} unit={unit && unitSymbol(unit)} />
      <span className="input-unit" data-invalid={error || fault ? true : undefined}>
        <Input className="input" size={size} placeholder={props.placeholder} autoComplete="off" spellCheck="false" />
        {unit && unitSymbol(unit) !== '' && (
          <span className="unit" aria-hidden="true">
            {unitSymbol(unit)}
          </span>
        )}
      </span>
      <FieldNotes description={description} error={error ?? fault} />
    </TextField>
  );
}
