import { Button } from '@/components/ui/Button';
import { Dialog } from '@/components/ui/Dialog';
import { clock } from '../state/clock';
import { useBench, useSaveState, useTools } from '../state/tools';
import { Versions } from './Versions';

/** Somebody else, or another tab, saved first: both versions side by side, and the person decides. */
export function LostRace() {
  const { reading, saver, store } = useTools();
  const state = useSaveState();
  const mine = useBench((bench) => bench.history.present);
  if (state.kind !== 'conflict') return null;
  const { current } = state;
  const takeTheirs = () => {
    saver.takeTheirs();
    store.perform({ type: 'replace', document: current.document, why: 'theirs' });
  };
  return (
    <Dialog
      title="This reading was changed elsewhere"
      role="alertdialog"
      mustAnswer
      wide
      isOpen
      onClose={() => {}}
      actions={
        <>
          <Button onPress={() => void import('../state/files').then((files) => files.downloadDraft(reading, mine))}>Download mine</Button>
          <Button onPress={takeTheirs}>Take theirs</Button>
          <Button variant="primary" onPress={() => saver.keepMine()}>
            Keep mine
          </Button>
        </>
      }
    >
      <p className="mb-2">
        {current.savedBy.name} saved another version at {clock(current.savedAt)}. Keeping yours replaces it; taking theirs replaces yours
        here, and Undo brings it back.
      </p>
      <Versions
        mine={{ document: mine, head: 'Yours, not saved' }}
        theirs={{ document: current.document, head: `Saved at ${clock(current.savedAt)}` }}
      />
    </Dialog>
  );
}
