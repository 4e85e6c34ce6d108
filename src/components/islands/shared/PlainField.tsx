import { unitSymbol } from '@/lib/units';

export interface PlainFieldProps {
  id: string;
  name: string;
  label: string;
  /** Unit as @/lib/units spells it; stands beside the box and is said with the label. */
  unit?: string;
  value: string | undefined;
  error?: string | undefined;
  hideLabel?: boolean;
  /** Label on the left, field on the right. */
  row?: boolean;
  size?: number;
  onBlur?: (() => void) | undefined;
}

/** A field of a plain form that also works without a script: what is typed stays in the browser's own field. */
export function PlainField({ id, name, label, unit, value, error, hideLabel = false, row = false, size = 7, onBlur }: PlainFieldProps) {
  const symbol = unit ? unitSymbol(unit) : '';
  return (
    <div className={row ? 'field field-row' : 'field'}>
      <label htmlFor={id} className={hideLabel ? 'sr-only' : 'label'}>
        {label}
        {symbol && <span className="sr-only"> in {symbol}</span>}
      </label>
      <span className="input-unit" data-invalid={error ? true : undefined}>
        <input
          className="input"
          id={id}
          name={name}
          size={size}
          defaultValue={value}
          autoComplete="off"
          spellCheck={false}
          aria-invalid={error ? true : undefined}
          aria-describedby={error ? `${id}-error` : undefined}
          onBlur={onBlur}
        />
        {symbol && (
          <span className="unit" aria-hidden="true">
            {symbol}
          </span>
        )}
      </span>
      {error && (
        <span id={`${id}-error`} className="error">
          {error}
        </span>
      )}
    </div>
  );
}
