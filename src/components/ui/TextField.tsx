import { Input } from 'react-aria-components/Input';
import { TextArea } from 'react-aria-components/TextArea';
import { TextField as AriaTextField, type TextFieldProps as AriaProps } from 'react-aria-components/TextField';
import { FieldLabel, FieldNotes, fieldClass, type FieldProps } from './Field';

export interface TextFieldProps extends FieldProps, Omit<AriaProps, 'className' | 'style' | 'children' | 'isInvalid'> {
  multiline?: boolean;
  rows?: number;
  placeholder?: string;
  className?: string;
}

export function TextField(props: TextFieldProps) {
  const { label, description, error, row, hideLabel, multiline = false, rows, placeholder, className, ...rest } = props;
  return (
    <AriaTextField validationBehavior="aria" {...rest} isInvalid={Boolean(error)} className={fieldClass(row, className)}>
      <FieldLabel label={label} hideLabel={hideLabel} />
      {multiline ? (
        <TextArea className="input" rows={rows ?? 3} placeholder={placeholder} />
      ) : (
        <Input className="input" placeholder={placeholder} />
      )}
      <FieldNotes description={description} error={error} />
    </AriaTextField>
  );
}
