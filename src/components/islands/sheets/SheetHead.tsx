import { lazy, Suspense, useState } from 'react';
import { printDate } from '@/components/sheets/dates';
import { sheetTitle } from '@/components/sheets/words';
import { Button } from '@/components/ui/Button';
import { ErrorBoundary } from '@/components/ui/ErrorBoundary';
import { Status } from '@/components/ui/Toast';
import type { SheetView } from '@/lib/contracts';
import { FormLoading } from './FormLoading';
import { focusSoon } from './use-page';

const SheetEditor = lazy(async () => ({ default: (await import('./SheetEditor')).SheetEditor }));

interface Props {
  sheet: SheetView;
  vendors: readonly string[];
  mayEdit: boolean;
}

const EDIT_BUTTON = 'sheet-edit';

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
          <Suspense fallback={<FormLoading />}>
            <SheetEditor sheet={sheet} vendors={vendors} onClose={close} />
          </Suspense>
        </div>
      ) : (
        <Identity sheet={sheet} />
      )}
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
