import { findChart, nudgeOf, placeOfSelection, ZOOM_STEP, type Tool } from '@/lib/editor';
import type { Px } from '@/lib/geometry';
import { insertAfterSelected, nudgeSelected, placeAt, removeSelected, stepSelection } from '../state/actions';
import { placeWords } from '../points/words';
import type { BenchTools } from '../state/tools';
import type { PointerGestures } from './pointer';

/** The parts of a key event that matter here. */
export interface Key {
  readonly key: string;
  readonly shiftKey: boolean;
  readonly altKey: boolean;
  readonly ctrlKey: boolean;
  readonly metaKey: boolean;
}

/** What keys ask for outside the stage. */
export interface KeyRequests {
  readonly editNumbers: () => void;
  readonly help: () => void;
}

const current = ({ store }: BenchTools) => {
  const { history, session } = store.get();
  return { session, chart: findChart(history.present, session.chart) };
};

/** Where the keyboard's cross-hairs are: where they were left, at what is picked out, or in the middle of the stage. */
const aimOf = (tools: BenchTools): Px => {
  const { session, chart } = current(tools);
  return tools.stage.aim()?.px ?? placeOfSelection(chart, session.selection) ?? tools.stage.middle();
};

const moveAim = (tools: BenchTools, [dx, dy]: Px): void => {
  const { chart } = current(tools);
  if (!chart) return;
  const [x, y] = aimOf(tools);
  const px: Px = [Math.min(chart.width, Math.max(0, x + dx)), Math.min(chart.height, Math.max(0, y + dy))];
  tools.stage.setAim({ px, by: 'keys', pressed: false });
  tools.stage.reveal(px);
  tools.announcer.say(placeWords(chart, px));
};

const arrow = (tools: BenchTools, by: Px): void => {
  if (current(tools).session.selection && !tools.frozen) nudgeSelected(tools, by);
  else moveAim(tools, by);
};

const escape = (tools: BenchTools, gestures: PointerGestures): boolean => {
  const { session, chart } = current(tools);
  if (gestures.cancel()) return true;
  if (session.tool === 'target') tools.store.go({ type: 'tool', tool: 'select' });
  else if (session.selection) {
    const px = placeOfSelection(chart, session.selection);
    tools.store.go({ type: 'select', selection: null });
    if (px) tools.stage.setAim({ px, by: 'keys', pressed: false });
  } else return false;
  return true;
};

const enter = (tools: BenchTools, requests: KeyRequests): void => {
  if (current(tools).session.selection) requests.editNumbers();
  else placeAt(tools, aimOf(tools));
};

const tool = (tools: BenchTools, to: Tool): void => {
  tools.store.go({ type: 'tool', tool: to });
  tools.announcer.say(to === 'place' ? 'Placing: press Enter to place at the cross-hairs' : 'Picking out and moving');
};

/** What a key does while the stage has the keyboard; false when it does nothing here and keeps its usual meaning. */
export function stageKey(tools: BenchTools, gestures: PointerGestures, key: Key, requests: KeyRequests): boolean {
  if (key.ctrlKey || key.metaKey) return false;
  const nudge = nudgeOf(key.key, { shift: key.shiftKey, alt: key.altKey });
  if (nudge) return (arrow(tools, nudge), true);
  if (key.altKey) return false;
  switch (key.key) {
    case '+':
    case '=':
      return (tools.stage.zoom(ZOOM_STEP), true);
    case '-':
      return (tools.stage.zoom(1 / ZOOM_STEP), true);
    case '0':
      return (tools.stage.fit(), true);
    case '[':
    case ']':
      return (stepSelection(tools, key.key === ']' ? 1 : -1), true);
    case 'Delete':
    case 'Backspace':
      return (removeSelected(tools), true);
    case 'Insert':
      return (insertAfterSelected(tools) || placeAt(tools, aimOf(tools)), true);
    case 'Enter':
      return (enter(tools, requests), true);
    case 'Escape':
      return escape(tools, gestures);
    case 'p':
    case 'v':
      return (tool(tools, key.key === 'p' ? 'place' : 'select'), true);
    case '?':
      return (requests.help(), true);
    case ' ':
      return (gestures.holdToPan(true), true);
    default:
      return false;
  }
}
