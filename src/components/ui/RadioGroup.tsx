import { RadioButton, RadioField, RadioGroup as AriaRadioGroup } from 'react-aria-components/RadioGroup';
import { FieldLabel, FieldNotes, fieldClass, type FieldProps } from './Field';
import type { Choice } from './Select';
import { classes } from './classes';

export interface RadioGroupProps<Id extends string> extends FieldProps {
  choices: readonly Choice<Id>[];
  value: Id | null;
  onChange: (id: Id) => void;
  orientation?: 'horizontal' | 'vertical';
  name?: string;
  isDisabled?: boolean;
  className?: string;
}

export function RadioGroup<Id extends string>(props: RadioGroupProps<Id>) {
  const { label, description, error, row, hideLabel, choices, value, onChange, orientation = 'vertical', className, ...rest } = props;
  return (
    <AriaRadioGroup
      {...rest}
      orientation={orientation}
      value={value}
      onChange={(id) => onChange(id as Id)}
      isInvalid={Boolean(error)}
      className={fieldClass(row, className)}
    >
      <FieldLabel label={label} hideLabel={hideLabel} />
      <div className={classes('flex', orientation === 'vertical' ? 'flex-col' : 'flex-wrap gap-x-4')}>
        {choices.map((choice) => (
          <RadioField key={choice.id} value={choice.id} isDisabled={choice.disabled}>
            <RadioButton className="check">
              <span className="check-box check-round" aria-hidden="true" />
              <span>
                {choice.label} {choice.hint && <span className="muted">{choice.hint}</span>}
              </span>
            </RadioButton>
          </RadioField>
        ))}
      </div>
      <FieldNotes description={description} error={error} />
    </AriaRadioGroup>
  );
}
