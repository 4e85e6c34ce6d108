import type { ReactNode } from 'react';
import { FieldError } from 'react-aria-components/FieldError';
import { Label } from 'react-aria-components/Label';
import { Text } from 'react-aria-components/Text';

export interface FieldProps {
  label: string;
  /** One short sentence under the field. */
  description?: string | undefined;
  /** What is wrong and how to mend it; null or absent when nothing is. */
  error?: string | null | undefined;
  /** Label on the left, control on the right, as in the forms beside a table. */
  row?: boolean | undefined;
  /** The label is spoken but not shown, where a column heading or a caption already says it. */
  hideLabel?: boolean | undefined;
}

export { fieldClass } from './field-class';

/** The label above or beside a control; a unit that stands beside the box is spoken with it. */
export const FieldLabel = ({ label, hideLabel, unit }: Pick<FieldProps, 'label' | 'hideLabel'> & { unit?: string | undefined }) => (
  <Label className={hideLabel ? 'sr-only' : 'label'}>
    {label}
    {unit && <span className="sr-only"> in {unit}</span>}
  </Label>
);

/** Hint and error below a control, tied to it for a screen reader. */
export const FieldNotes = ({ description, error }: Pick<FieldProps, 'description' | 'error'>): ReactNode => (
  <>
    {description && (
      <Text slot="description" className="hint">
        {description}
      </Text>
    )}
    <FieldError className="error">{error ?? undefined}</FieldError>
  </>
);
