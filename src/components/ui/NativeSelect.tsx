import { useId } from 'react';
import { fieldClass } from './field-class';
import type { SelectProps } from './Select';

/** The browser's own list with the look of `Select`: no script of its own, and the phone's picker on a phone. */
export function NativeSelect<Id extends string>(props: SelectProps<Id>) {
  const {
    label,
    description,
    error,
    row,
    hideLabel,
    choices,
    value,
    onChange,
    placeholder = 'Choose',
    name,
    isDisabled,
    isRequired,
    className,
  } = props;
  const id = useId();
  const notes = [description && `${id}-hint`, error && `${id}-error`].filter(Boolean).join(' ') || undefined;
  return (
    <div className={fieldClass(row, className)}>
      <label htmlFor={id} className={hideLabel ? 'sr-only' : 'label'}>
        {label}
      </label>
      <select
        id={id}
        className="select"
        name={name}
        value={value ?? ''}
        disabled={isDisabled}
        required={isRequired}
        aria-invalid={error ? true : undefined}
        aria-describedby={notes}
        onChange={(event) => onChange(event.target.value as Id)}
      >
        {value === null && (
          <option value="" disabled>
            {placeholder}
          </option>
        )}
        {choices.map((choice) => (
          <option key={choice.id} value={choice.id} disabled={choice.disabled}>
            {choice.hint ? `${choice.label} (${choice.hint})` : choice.label}
          </option>
        ))}
      </select>
      {description && (
        <span id={`${id}-hint`} className="hint">
          {description}
        </span>
      )}
      {error && (
        <span id={`${id}-error`} className="error">
          {error}
        </span>
      )}
    </div>
  );
}
