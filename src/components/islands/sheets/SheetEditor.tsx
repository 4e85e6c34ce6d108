import { useEffect, useState } from 'react';
import { ask } from '@/components/islands/api';
import type { SheetBody, SheetView } from '@/lib/contracts';
import { differences } from './differences';
import { FormFrame } from './FormFrame';
import { LostRace } from './LostRace';
import { checkSheet, draftOfSheet, sheetLines } from './sheet-draft';
import { SheetFields } from './SheetFields';
import { useForm } from './use-form';

interface Props {
  sheet: SheetView;
  vendors: readonly string[];
  onClose: (after: SheetView, words: string) => void;
}

const putSheet = async (sheet: SheetView, body: SheetBody) =>
  (await ask<SheetView>(`/api/sheets/${sheet.id}`, { method: 'PUT', body, ifMatch: `"${sheet.version}"` })).data;

/** Changes what a sheet is, over the version that was seen. */
export function SheetEditor({ sheet, vendors, onClose }: Props) {
  const [base, setBase] = useState(sheet);
  const [race, setRace] = useState<SheetBody | null>(null);
  const [initial] = useState(() => draftOfSheet(sheet));
  const lost = (current: unknown, mine: SheetBody) => {
    const theirs = current as SheetView;
    // the same words twice: an answer that went astray, or two people of one mind
    if (differences(sheetLines(mine), sheetLines(theirs)).length === 0) return onClose(theirs, 'Saved.');
    setBase(theirs);
    setRace(mine);
  };
  const form = useForm({
    initial,
    prefix: 'sheet.',
    check: checkSheet,
    send: (body) => putSheet(base, body),
    onSent: (saved) => onClose(saved, 'Saved.'),
    onLostRace: lost,
  });
  useEffect(() => document.getElementById('sheet.vendor')?.focus(), []);
  return (
    <>
      {race && (
        <LostRace
          what="sheet"
          lines={differences(sheetLines(race), sheetLines(base))}
          onKeepMine={() => form.submit()}
          onTakeTheirs={() => onClose(base, 'Theirs was taken.')}
          busy={form.busy}
        />
      )}
      <FormFrame form={form} label="What this sheet is" action="Save" onCancel={() => onClose(base, '')}>
        <SheetFields form={form} vendors={vendors} />
      </FormFrame>
    </>
  );
}
