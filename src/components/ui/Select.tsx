import { Button } from 'react-aria-components/Button';
import { ListBox, ListBoxItem } from 'react-aria-components/ListBox';
import { Popover } from 'react-aria-components/Popover';
import { Select as AriaSelect, SelectValue } from 'react-aria-components/Select';
import { FieldLabel, FieldNotes, fieldClass, type FieldProps } from './Field';

export interface Choice<Id extends string = string> {
  readonly id: Id;
  readonly label: string;
  /** A muted word after the label. */
  readonly hint?: string | undefined;
  readonly disabled?: boolean | undefined;
}

export interface SelectProps<Id extends string> extends FieldProps {
  choices: readonly Choice<Id>[];
  value: Id | null;
  onChange: (id: Id) => void;
  placeholder?: string;
  name?: string;
  isDisabled?: boolean;
  isRequired?: boolean;
  className?: string;
}

/** One of several, in a list that opens. On pages that must stay light use `NativeSelect`, which looks the same. */
export function Select<Id extends string>(props: SelectProps<Id>) {
  const { label, description, error, row, hideLabel, choices, value, onChange, placeholder = 'Choose', className, ...rest } = props;
  const disabledKeys = choices.filter((choice) => choice.disabled).map((choice) => choice.id);
  return (
    <AriaSelect
      {...rest}
      validationBehavior="aria"
      isInvalid={Boolean(error)}
      placeholder={placeholder}
      value={value}
      onChange={(key) => key !== null && onChange(key as Id)}
      disabledKeys={disabledKeys}
      className={fieldClass(row, className)}
    >
      <FieldLabel label={label} hideLabel={hideLabel} />
      <Button className="select">
        <SelectValue className="truncate">{({ selectedText, defaultChildren }) => selectedText || defaultChildren}</SelectValue>
        <span aria-hidden="true">▾</span>
      </Button>
      <FieldNotes description={description} error={error} />
      <Popover className="popover">
        <ListBox items={choices} className="outline-none">
          {(choice) => (
            <ListBoxItem id={choice.id} textValue={choice.label} className="option">
              {({ isSelected }) => (
                <>
                  <span className="option-mark" aria-hidden="true">
                    {isSelected ? '✓' : ''}
                  </span>
                  <span>{choice.label}</span>
                  {choice.hint && <span className="muted">{choice.hint}</span>}
                </>
              )}
            </ListBoxItem>
          )}
        </ListBox>
      </Popover>
    </AriaSelect>
  );
}
