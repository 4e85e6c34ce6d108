import { lazy, Suspense, useState } from 'react';
import { partName } from '@/components/sheets/words';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorBoundary } from '@/components/ui/ErrorBoundary';
import { TextField } from '@/components/ui/TextField';
import { Status } from '@/components/ui/Toast';
import type { ModuleView, VendorModule } from '@/lib/contracts';
import { FormLoading } from './FormLoading';
import { ModuleRow } from './ModuleRow';
import { ADD_BUTTON, useModules } from './use-modules';

const AddModule = lazy(async () => ({ default: (await import('./ModuleForm')).AddModule }));
const EditModule = lazy(async () => ({ default: (await import('./ModuleForm')).EditModule }));

interface Props {
  sheetId: number;
  vendor: string;
  modules: readonly VendorModule[];
  /** Own readings of this sheet that can be gone on with: module to reading. */
  drafts: Readonly<Record<number, number>>;
  mayAdd: boolean;
  mayStart: boolean;
}

type Desk = ReturnType<typeof useModules>;

/** From so many modules on there is a field to find one by. */
const FIND_FROM = 9;

const byName = (a: ModuleView, b: ModuleView) => partName(a).localeCompare(partName(b), 'en', { numeric: true });
const has = (module: ModuleView, words: string) => partName(module).toLowerCase().includes(words.trim().toLowerCase());

function Modules(props: Props) {
  const desk = useModules(props.sheetId, props.modules);
  return (
    <section aria-labelledby="modules">
      <div className="mb-2 flex flex-wrap items-center gap-x-3">
        <h2 id="modules" className="mb-0 leading-6">
          Modules of {props.vendor}
        </h2>
        <Status>{desk.said}</Status>
      </div>
      <div className="sheet p-4">
        <p role="alert" className={desk.refusal ? 'error mb-3' : 'sr-only'}>
          {desk.refusal}
        </p>
        {desk.open?.is === 'add' ? <Adding desk={desk} {...props} /> : props.mayAdd && <AddButton desk={desk} vendor={props.vendor} />}
        {desk.modules.length > 0 && <ModuleList desk={desk} {...props} />}
      </div>
    </section>
  );
}

function Adding({ desk, vendor, mayStart }: Props & { desk: Desk }) {
  if (desk.open?.is !== 'add') return null;
  return (
    <div className={desk.modules.length > 0 ? 'mb-4 border-b border-line pb-4' : ''}>
      <h3 className="mb-3">A module as this sheet prints it</h3>
      <Suspense fallback={<FormLoading />}>
        <AddModule
          key={desk.open.key}
          vendor={vendor}
          like={desk.open.like}
          onAdded={desk.added}
          onCancel={desk.cancelAdd}
          mayStart={mayStart}
        />
      </Suspense>
    </div>
  );
}

function AddButton({ desk, vendor }: { desk: Desk; vendor: string }) {
  const button = (
    <Button id={ADD_BUTTON} onPress={() => desk.openAdd()}>
      Add a module
    </Button>
  );
  if (desk.modules.length > 0) return button;
  return (
    <EmptyState title={`No module of ${vendor} yet`} action={button}>
      Add the module whose curves this sheet shows, with its ratings as printed; then start its reading.
    </EmptyState>
  );
}

function ModuleList({ desk, drafts, mayAdd, mayStart }: Props & { desk: Desk }) {
  const [words, setWords] = useState('');
  const { modules, open } = desk;
  const shown = modules.filter((module) => has(module, words)).toSorted(byName);
  return (
    <>
      {modules.length >= FIND_FROM && (
        <TextField
          label={`Find among ${modules.length} modules`}
          value={words}
          onChange={setWords}
          className="mt-3 max-w-80"
          autoComplete="off"
          spellCheck="false"
        />
      )}
      <ul className="flex flex-col">
        {shown.map((module) => (
          <ModuleRow
            key={module.id}
            module={module}
            draft={drafts[module.id]}
            may={{ edit: module.mayEdit, start: mayStart, add: mayAdd }}
            onStart={() => desk.start(module.id)}
            onEdit={() => desk.openEdit(module.id)}
            onAddLike={() => desk.openAdd(module)}
          >
            {open?.is === 'edit' && open.id === module.id && (
              <Suspense fallback={<FormLoading />}>
                <EditModule module={module} onClose={desk.edited} />
              </Suspense>
            )}
          </ModuleRow>
        ))}
      </ul>
      {shown.length === 0 && <p className="muted mt-3">No module here has “{words.trim()}” in its name.</p>}
    </>
  );
}

/** The modules of a sheet's vendor: start a reading of one, add one, correct one. */
export const SheetModules = (props: Props) => (
  <ErrorBoundary>
    <Modules {...props} />
  </ErrorBoundary>
);
