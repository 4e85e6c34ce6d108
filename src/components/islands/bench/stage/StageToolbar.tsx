import { memo } from 'react';
import { Button } from '@/components/ui/Button';
import { ToggleButton } from '@/components/ui/ToggleButton';
import { Toolbar } from '@/components/ui/Toolbar';
import { ZOOM_STEP, type Tool } from '@/lib/editor';
import { useBench, useTools } from '../state/tools';

const PLACES = { frame: 'marks', curves: 'points' } as const;

/** A word that goes where there is little room. */
const Wide = ({ children }: { children: string }) => <span className="bench-wide">{children}</span>;

/** The tools of the station in hand, and the zoom. */
export const StageToolbar = memo(function StageToolbar({ onHelp }: { onHelp: () => void }) {
  const { store, stage, frozen } = useTools();
  const station = useBench((state) => state.session.station);
  const tool = useBench((state) => state.session.tool);
  const picked = useBench((state) => state.session.selection !== null);
  const use = (to: Tool) => () => store.go({ type: 'tool', tool: to });
  return (
    <Toolbar label="Tools of the picture" className="bench-tools">
      {(station === 'frame' || station === 'curves') && !frozen && (
        <>
          <ToggleButton size="small" isSelected={tool === 'place'} onChange={use('place')} aria-keyshortcuts="P">
            Place<Wide>{PLACES[station]}</Wide>
          </ToggleButton>
          <ToggleButton size="small" isSelected={tool === 'select'} onChange={use('select')} aria-keyshortcuts="V">
            Pick<Wide>and move</Wide>
          </ToggleButton>
          {picked && (
            <ToggleButton
              size="small"
              isSelected={tool === 'target'}
              className="bench-wide"
              onChange={(on) => use(on ? 'target' : 'select')()}
            >
              Move it here
            </ToggleButton>
          )}
        </>
      )}
      <span className="bench-zoom">
        <Button size="small" icon aria-label="Zoom out" onPress={() => stage.zoom(1 / ZOOM_STEP)}>
          −
        </Button>
        <Button size="small" icon aria-label="Zoom in" onPress={() => stage.zoom(ZOOM_STEP)}>
          +
        </Button>
        <Button size="small" onPress={() => stage.fit()}>
          Fit
        </Button>
        <Button size="small" variant="quiet" icon aria-label="Keys" onPress={onHelp}>
          ?
        </Button>
      </span>
    </Toolbar>
  );
});
