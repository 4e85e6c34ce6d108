import { QuantityField } from '@/components/ui/QuantityField';
import type { Form } from './use-form';

interface Props {
  form: Pick<Form<object>, 'prefix' | 'problems' | 'fault'>;
  /** Name of the field as the API knows it. */
  name: string;
  label: string;
  unit?: string;
  description?: string;
  value: number | null;
  onChange: (value: number | null) => void;
  size?: number;
  autoFocus?: boolean;
}

/** A number of a form with its unit; empty is "not stated". */
export const NumberField = ({ form, name, ...rest }: Props) => (
  <QuantityField {...rest} id={form.prefix + name} error={form.problems[name]} onFault={(sentence) => form.fault(name, sentence)} />
);
