import { memo, useRef } from 'react';
import { Button } from '@/components/ui/Button';
import { Menu } from '@/components/ui/Menu';
import { redoLabel, undoLabel } from '@/lib/editor';
import { useBench, useTools } from '../state/tools';
import { SaveStatus } from './SaveStatus';
import { Stations } from './Stations';

const FILE_ITEMS = [
  { id: 'reading', label: 'Download reading' },
  { id: 'draft', label: 'Download draft as it is' },
  { id: 'import', label: 'Import reading' },
] as const;

/** Where one is, how it stands, and the way back. */
export const BenchBar = memo(function BenchBar({ onMessage }: { onMessage: (message: string) => void }) {
  const { frozen } = useTools();
  return (
    <div className="bench-bar">
      <Stations />
      <div className="bench-bar-end">
        <SaveStatus />
        {!frozen && <UndoButtons />}
        <FileMenu onMessage={onMessage} />
      </div>
    </div>
  );
});

function UndoButtons() {
  const { store } = useTools();
  const undo = useBench((state) => undoLabel(state.history) ?? state.history.gesture?.label ?? null);
  const redo = useBench((state) => redoLabel(state.history));
  return (
    <>
      <Button
        size="small"
        isDisabled={undo === null}
        onPress={store.undo}
        aria-label={undo === null ? 'Undo' : `Undo ${undo}`}
        aria-keyshortcuts="Control+Z"
      >
        Undo{undo !== null && <span className="bench-wide muted">{undo}</span>}
      </Button>
      <Button
        size="small"
        isDisabled={redo === null}
        onPress={store.redo}
        aria-label={redo === null ? 'Redo' : `Redo ${redo}`}
        aria-keyshortcuts="Control+Shift+Z"
      >
        Redo{redo !== null && <span className="bench-wide muted">{redo}</span>}
      </Button>
    </>
  );
}

/** Reading documents out and in. */
function FileMenu({ onMessage }: { onMessage: (message: string) => void }) {
  const { reading, pages, store, frozen } = useTools();
  const input = useRef<HTMLInputElement>(null);
  const act = async (id: (typeof FILE_ITEMS)[number]['id']) => {
    if (id === 'import') return input.current?.click();
    const files = await import('../state/files');
    const draft = store.get().history.present;
    if (id === 'draft') return files.downloadDraft(reading, draft);
    const problems = files.downloadReading(reading, draft, pages);
    if (problems.length > 0) onMessage(leftOut(draft.charts.length, new Set(problems.map(({ chart }) => chart)).size));
  };
  const take = async (file: File | undefined) => {
    if (!file) return;
    const { readFile } = await import('../state/files');
    const taken = readFile(await file.text(), pages);
    if (!taken.ok) return onMessage(taken.message);
    store.perform({ type: 'replace', document: taken.document, why: 'import' });
    onMessage('The reading has been imported. Undo brings back what was here before.');
  };
  return (
    <>
      <Menu
        label="File"
        button={{ size: 'small' }}
        items={FILE_ITEMS.filter(({ id }) => !frozen || id !== 'import')}
        onAction={(id) => void act(id)}
      />
      <input
        ref={input}
        type="file"
        accept="application/json,.json"
        aria-label="Reading to import"
        hidden
        onChange={(event) => {
          void take(event.target.files?.[0]);
          event.target.value = '';
        }}
      />
    </>
  );
}

const leftOut = (charts: number, unfinished: number): string =>
  charts === unfinished
    ? 'No chart is finished yet, so there is no reading to download. “Download draft as it is” keeps everything.'
    : `${unfinished} of ${charts} charts ${unfinished === 1 ? 'is' : 'are'} not finished and stayed out of the reading. “Download draft as it is” keeps everything.`;
