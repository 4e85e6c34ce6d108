import { useEffect, useRef } from 'react';
import { Button } from '@/components/ui/Button';
import { Table } from '@/components/ui/Table';
import type { Difference } from './differences';

interface Props {
  /** What is being changed, such as "sheet". */
  what: string;
  lines: readonly Difference[];
  onKeepMine: () => void;
  onTakeTheirs: () => void;
  busy: boolean;
}

const Stated = ({ words }: { words: string | null }) =>
  words ?? (
    <>
      <span aria-hidden="true">–</span>
      <span className="sr-only">not stated</span>
    </>
  );

/** Somebody was quicker: both versions side by side, and the choice between them. */
export function LostRace({ what, lines, onKeepMine, onTakeTheirs, busy }: Props) {
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => box.current?.focus(), []);
  return (
    <div ref={box} tabIndex={-1} role="alert" className="notice notice-attention mb-4">
      <h2>Somebody else saved this {what} while you were at it</h2>
      <p className="mt-1">Nothing is lost. Compare what differs, then keep yours over theirs or take theirs.</p>
      <Table
        caption={`What differs between the two versions of this ${what}`}
        hideCaption
        head={
          <>
            <th scope="col">Differs</th>
            <th scope="col">Yours</th>
            <th scope="col">Saved by somebody else</th>
          </>
        }
      >
        {lines.map(({ name, mine, theirs }) => (
          <tr key={name}>
            <th scope="row">{name}</th>
            <td>
              <Stated words={mine} />
            </td>
            <td>
              <Stated words={theirs} />
            </td>
          </tr>
        ))}
      </Table>
      <div className="mt-3 flex flex-wrap gap-2">
        <Button onPress={onTakeTheirs}>Take theirs</Button>
        <Button onPress={onKeepMine} isPending={busy}>
          Keep mine
        </Button>
      </div>
    </div>
  );
}
