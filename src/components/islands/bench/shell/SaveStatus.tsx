import { Button } from '@/components/ui/Button';
import { clock } from '../state/clock';
import type { SaveState } from '../state/saver';
import { useSaveState, useTools } from '../state/tools';

const words = (state: SaveState): string => {
  switch (state.kind) {
    case 'saved':
      return `saved ${clock(state.at)}`;
    case 'saving':
      return 'saving';
    case 'failed':
    case 'refused':
      return `not saved: ${state.why}`;
    case 'signedOut':
      return 'not saved: you are signed out. Your work is kept in this browser.';
    case 'conflict':
      return 'not saved: this reading was changed elsewhere.';
  }
};

/** How the draft stands to the server, in a line that is spoken when it changes. */
export function SaveStatus() {
  const { saver, frozen } = useTools();
  const state = useSaveState();
  const trouble = state.kind !== 'saved' && state.kind !== 'saving';
  if (frozen) return <span className="muted">read only</span>;
  return (
    <span className="bench-save">
      <span role="status" aria-atomic="true" className={trouble ? 'bench-trouble' : 'muted'}>
        {words(state)}
      </span>
      {state.kind === 'signedOut' && (
        <a href={`/sign-in?next=%2F`} target="_blank" rel="opener">
          Sign in again in another tab
        </a>
      )}
      {(state.kind === 'signedOut' || state.kind === 'failed' || state.kind === 'refused') && (
        <Button size="small" onPress={() => void saver.flush()}>
          Save now
        </Button>
      )}
    </span>
  );
}
