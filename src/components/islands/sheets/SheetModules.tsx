import { useState } from 'react';
import { api, ApiProblem } from '@/components/islands/api';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorBoundary } from '@/components/ui/ErrorBoundary';
import { TextField } from '@/components/ui/TextField';
import { Status } from '@/components/ui/Toast';
import { partName } from '@/components/sheets/words';
import type { ModuleView, VendorModule } from '@/lib/contracts';
import { emptyModule, likeModule, type ModuleDraft } from './module-draft';
import { AddModule, EditModule } from './ModuleForm';
import { ModuleRow } from './ModuleRow';
import { focusSoon } from './use-page';

interface Props {
  sheetId: number;
  vendor: string;
  modules: readonly VendorModule[];
  /** Own readings of this sheet that can be gone on with: module to reading. */
  drafts: Readonly<Record<number, number>>;
  mayAdd: boolean;
  mayStart: boolean;
}

type Open =
  { readonly form: 'add'; readonly draft: ModuleDraft; readonly key: number } | { readonly form: 'edit'; readonly id: number } | null;

const ADD_BUTTON = 'add-module';
const FILTER_FROM = 9;

const byName = (a: ModuleView, b: ModuleView) => partName(a).localeCompare(partName(b), 'en', { numeric: true });
const matches = (module: ModuleView, words: string) => partName(module).toLowerCase().includes(words.trim().toLowerCase());

/** Asks for a reading and goes to its bench; answers a sentence when it could not be started. */
async function startReading(sheetId: number, moduleId: number): Promise<string> {
  try {
    const { id } = await api.post<{ id: number }>(`/api/sheets/${sheetId}/readings`, { moduleId });
    location.assign(`/bench/${id}`);
    return '';
  } catch (error) {
    if (error instanceof ApiProblem) return error.detail;
    throw error;
  }
}

function Modules({ sheetId, vendor, modules: first, drafts, mayAdd, mayStart }: Props) {
  const [modules, setModules] = useState(first);
  const [open, setOpen] = useState<Open>(null);
  const [words, setWords] = useState('');
  const [said, setSaid] = useState('');
  const [refusal, setRefusal] = useState('');
  const shown = modules.filter((module) => matches(module, words)).toSorted(byName);

  const openAdd = (draft: ModuleDraft) => setOpen((now) => ({ form: 'add', draft, key: now?.form === 'add' ? now.key + 1 : 1 }));
  const close = (focus: string, sentence = '') => {
    setOpen(null);
    setSaid(sentence);
    focusSoon(focus);
  };
  const start = async (moduleId: number) => setRefusal(await startReading(sheetId, moduleId));
  const added = async (module: ModuleView, andStart: boolean) => {
    setModules((now) => [...now, { ...module, approved: false, mayEdit: true }]);
    close(ADD_BUTTON, `${partName(module)} is added.`);
    if (andStart) await start(module.id);
  };
  const edited = (after: ModuleView, sentence: string) => {
    setModules((now) => now.map((module) => (module.id === after.id ? { ...module, ...after } : module)));
    close(`edit-${after.id}`, sentence);
  };

  return (
    <section aria-labelledby="modules">
      <div className="mb-2 flex flex-wrap items-baseline gap-x-3">
        <h2 id="modules">Modules of {vendor}</h2>
        <Status>{said}</Status>
      </div>
      <div className="sheet p-4">
        <p role="alert" className={refusal ? 'error mb-3' : 'sr-only'}>
          {refusal}
        </p>
        {open?.form === 'add' ? (
          <div className="mb-4 border-b border-line pb-4">
            <h3 className="mb-3">A module as this sheet prints it</h3>
            <AddModule
              key={open.key}
              draft={open.draft}
              onAdded={(...args) => void added(...args)}
              onCancel={() => close(ADD_BUTTON)}
              mayStart={mayStart}
            />
          </div>
        ) : (
          mayAdd &&
          modules.length > 0 && (
            <Button id={ADD_BUTTON} onPress={() => openAdd(emptyModule(vendor))}>
              Add a module
            </Button>
          )
        )}
        {modules.length === 0 && open === null && (
          <EmptyState
            title={`No module of ${vendor} yet`}
            action={
              mayAdd && (
                <Button id={ADD_BUTTON} onPress={() => openAdd(emptyModule(vendor))}>
                  Add a module
                </Button>
              )
            }
          >
            Add the module whose curves this sheet shows, with its ratings as printed; then start its reading.
          </EmptyState>
        )}
        {modules.length >= FILTER_FROM && (
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
              onStart={() => start(module.id)}
              onEdit={() => setOpen({ form: 'edit', id: module.id })}
              onAddLike={() => openAdd(likeModule(module))}
            >
              {open?.form === 'edit' && open.id === module.id && <EditModule module={module} onClose={edited} />}
            </ModuleRow>
          ))}
        </ul>
        {modules.length > 0 && shown.length === 0 && <p className="muted mt-3">No module here has “{words.trim()}” in its name.</p>}
      </div>
    </section>
  );
}

/** The modules of a sheet's vendor: start a reading of one, add one, correct one. */
export const SheetModules = (props: Props) => (
  <ErrorBoundary>
    <Modules {...props} />
  </ErrorBoundary>
);
