import { useState } from 'react';
import { ask } from '@/components/islands/api';
import { printDate } from '@/components/sheets/dates';
import { sheetTitle } from '@/components/sheets/words';
import { Button } from '@/components/ui/Button';
import { ErrorBoundary } from '@/components/ui/ErrorBoundary';
import { Status } from '@/components/ui/Toast';
import type { SheetBody, SheetView } from '@/lib/contracts';
import { differences } from './differences';
import { FormFrame } from './FormFrame';
import { LostRace } from './LostRace';
import { checkSheet, draftOfSheet, sheetLines } from './sheet-draft';
import { SheetFields } from './SheetFields';
import { useForm } from './use-form';
import { focusSoon } from './use-page';

interface Props {
  sheet: SheetView;
  vendors: readonly string[];
  mayEdit: boolean;
}

const EDIT_BUTTON = 'sheet-edit';

const putSheet = async (sheet: SheetView, body: SheetBody) =>
  (await ask<SheetView>(`/api/sheets/${sheet.id}`, { method: 'PUT', body, ifMatch: `"${sheet.version}"` })).data;

function Head({ sheet: first, vendors, mayEdit }: Props) {
  const [sheet, setSheet] = useState(first);
  const [editing, setEditing] = useState(false);
  const [said, setSaid] = useState('');
  const close = (after: SheetView, words: string) => {
    // the modules below are those of the vendor
    if (after.vendorId !== sheet.vendorId) return location.reload();
    document.title = document.title.replace(sheetTitle(sheet), sheetTitle(after));
    setSheet(after);
    setEditing(false);
    setSaid(words);
    focusSoon(EDIT_BUTTON);
  };
  return (
    <>
      <div className="page-head">
        <h1>{sheetTitle(sheet)}</h1>
        <Status>{said}</Status>
        {mayEdit && !editing && (
          <div className="page-actions">
            <Button id={EDIT_BUTTON} onPress={() => setEditing(true)}>
              Edit
            </Button>
          </div>
        )}
      </div>
      {editing ? (
        <div className="sheet mt-3 p-4">
          <SheetEditor sheet={sheet} vendors={vendors} onClose={close} />
        </div>
      ) : (
        <Identity sheet={sheet} />
      )}
    </>
  );
}

function SheetEditor({
  sheet,
  vendors,
  onClose,
}: {
  sheet: SheetView;
  vendors: readonly string[];
  onClose: (after: SheetView, words: string) => void;
}) {
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

const NotStated = () => (
  <>
    <span aria-hidden="true">–</span>
    <span className="sr-only">not stated</span>
  </>
);

function Identity({ sheet }: { sheet: SheetView }) {
  const facts: readonly (readonly [string, string])[] = [
    ['Number', sheet.number],
    ['Revision', sheet.revision],
    ['Date', printDate(sheet.dated)],
    ['Obtained on', printDate(sheet.obtainedOn)],
    ['Obtained from', sheet.obtainedFrom],
  ];
  return (
    <dl className="mt-2 flex flex-wrap gap-x-8 gap-y-2">
      <Fact name="Vendor">
        <a href={`/vendors/${sheet.vendorId}`}>{sheet.vendor}</a>
      </Fact>
      {facts.map(([name, words]) => (
        <Fact key={name} name={name}>
          {words || <NotStated />}
        </Fact>
      ))}
    </dl>
  );
}

const Fact = ({ name, children }: { name: string; children: React.ReactNode }) => (
  <div className="min-w-0">
    <dt className="hint">{name}</dt>
    <dd>{children}</dd>
  </div>
);

/** What a sheet is, at the head of its page, to be changed in place. */
export const SheetHead = (props: Props) => (
  <ErrorBoundary>
    <Head {...props} />
  </ErrorBoundary>
);
