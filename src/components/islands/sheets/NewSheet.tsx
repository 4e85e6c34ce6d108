import { useState } from 'react';
import { api } from '@/components/islands/api';
import { ErrorBoundary } from '@/components/ui/ErrorBoundary';
import type { SheetView } from '@/lib/contracts';
import { FormFrame } from './FormFrame';
import { checkSheet, emptySheet } from './sheet-draft';
import { SheetFields } from './SheetFields';
import { useForm } from './use-form';

interface Props {
  /** Names of the vendors that are known. */
  vendors: readonly string[];
  /** The vendor to begin with. */
  vendor: string;
  /** Year-month-day. */
  today: string;
}

function SheetForm({ vendors, vendor, today }: Props) {
  const [initial] = useState(() => emptySheet(today, vendor));
  const form = useForm({
    initial,
    prefix: 'sheet.',
    check: checkSheet,
    send: (body) => api.post<SheetView>('/api/sheets', body),
    onSent: (sheet) => location.assign(`/sheets/${sheet.id}`),
  });
  return (
    <FormFrame form={form} label="Add a sheet" action="Add the sheet">
      <SheetFields form={form} vendors={vendors} />
    </FormFrame>
  );
}

export const NewSheet = (props: Props) => (
  <ErrorBoundary>
    <SheetForm {...props} />
  </ErrorBoundary>
);
