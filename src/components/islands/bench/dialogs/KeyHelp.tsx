import { Dialog } from '@/components/ui/Dialog';

const KEYS: readonly (readonly [keys: readonly string[], does: string, also: string])[] = [
  [['←', '→', '↑', '↓'], 'move what is picked out, or the cross-hairs, by one pixel of the picture', 'arrow buttons beside the table'],
  [['Shift + arrow'], 'by ten pixels', 'step “10\u00A0px”'],
  [['Alt + arrow'], 'by a tenth of a pixel', 'step “0.1\u00A0px”'],
  [['Enter'], 'place at the cross-hairs; with something picked out, type its numbers', 'click; fields beside the table'],
  [['Insert'], 'place a point after the one picked out', 'click'],
  [['[', ']'], 'previous and next point or mark', 'buttons [ and ]'],
  [['Delete'], 'remove what is picked out', 'Remove'],
  [['Esc'], 'give up a drag, then let go of what is picked out', ''],
  [['P', 'V'], 'place, or pick and move', 'buttons above the picture'],
  [['+', '−', '0'], 'zoom in, zoom out, show the whole picture', 'buttons above the picture'],
  [['Space'], 'hold to pan with the mouse', 'middle button, two fingers, or drag the ground while picking'],
  [['Ctrl + Z'], 'undo', 'Undo'],
  [['Ctrl + Shift + Z', 'Ctrl + Y'], 'redo', 'Redo'],
  [['Tab'], 'leave the picture', ''],
  [['?'], 'this list', 'the ? button'],
];

/** Every key of the bench, and the button that does the same. */
export function KeyHelp({ isOpen, onClose }: { isOpen: boolean; onClose: () => void }) {
  return (
    <Dialog title="Keys" isOpen={isOpen} onClose={onClose} wide>
      <p className="muted mb-2">
        They work while the picture has the keyboard; click it or tab to it. Undo and redo work everywhere but in a text field, which keeps
        its own.
      </p>
      <div className="table-scroll">
        <table className="table">
          <thead>
            <tr>
              <th scope="col">Key</th>
              <th scope="col">Does</th>
              <th scope="col">Without the key</th>
            </tr>
          </thead>
          <tbody>
            {KEYS.map(([keys, does, also]) => (
              <tr key={does}>
                <td className="whitespace-nowrap">
                  {keys.map((key) => (
                    <kbd key={key} className="mr-1">
                      {key}
                    </kbd>
                  ))}
                </td>
                <td>{does}</td>
                <td className="muted">{also}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </Dialog>
  );
}
