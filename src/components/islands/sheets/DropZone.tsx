import { useEffect, useRef, useState, type DragEvent, type ReactNode } from 'react';
import { Button } from '@/components/ui/Button';
import { classes } from '@/components/ui/classes';
import { carriesFiles, droppedFiles, mayBeDropped, namePasted, pastedFiles } from './picked-files';
import { useAwake } from './use-page';

interface Props {
  /** Labels in use, so that pasted pictures get others. */
  labels: readonly string[];
  largest: string;
  /** Nothing is here yet: say what to do. */
  empty: boolean;
  onFiles: (files: readonly File[], refused?: readonly string[]) => void;
  children: ReactNode;
}

const ACCEPT = 'image/png,image/jpeg,image/webp,image/tiff,image/gif';
export const CHOOSE_BUTTON = 'choose-pictures';

/** Takes pictures that are dropped anywhere on it, chosen from the disk, or pasted anywhere on the page. */
export function DropZone({ labels, largest, empty, onFiles, children }: Props) {
  const input = useRef<HTMLInputElement>(null);
  const { over, handlers } = useDrop(onFiles);
  usePaste(labels, onFiles);
  const choose = (chosen: FileList | null) => {
    const files = [...(chosen ?? [])];
    if (files.length > 0) onFiles(files);
    if (input.current) input.current.value = '';
  };
  return (
    <div {...handlers} className={classes('sheet flex flex-col gap-4 p-4', over && 'outline outline-2 outline-offset-2 outline-ink')}>
      <div className={classes('flex flex-wrap items-center gap-x-4 gap-y-2', empty && 'justify-center py-8 text-center')}>
        {empty && (
          <p className="w-full">
            <b>This sheet has no pages yet.</b> Add a picture of each page that has curves.
          </p>
        )}
        <Button id={CHOOSE_BUTTON} variant={empty ? 'primary' : 'plain'} onPress={() => input.current?.click()}>
          {empty ? 'Choose pictures' : 'Add pages'}
        </Button>
        <PasteButton labels={labels} onFiles={onFiles} />
        <p className="hint basis-60 grow">
          {over ? (
            <b>Let go to add them.</b>
          ) : (
            <>
              Or drop them here, or paste one with <kbd>Ctrl</kbd> <kbd>V</kbd>.
            </>
          )}{' '}
          PNG, JPEG, WebP, TIFF or GIF, up to {largest} each.
        </p>
        <input
          ref={input}
          type="file"
          multiple
          accept={ACCEPT}
          className="hidden"
          tabIndex={-1}
          aria-hidden="true"
          onChange={(event) => choose(event.target.files)}
        />
      </div>
      {children}
    </div>
  );
}

function useDrop(onFiles: Props['onFiles']) {
  const [over, setOver] = useState(false);
  useEffect(() => {
    // a file let go beside the zone would otherwise replace the page
    const swallow = (event: globalThis.DragEvent) => {
      if (event.defaultPrevented || !carriesFiles(event.dataTransfer)) return;
      event.preventDefault();
      event.dataTransfer!.dropEffect = 'none';
    };
    window.addEventListener('dragover', swallow);
    window.addEventListener('drop', swallow);
    return () => {
      window.removeEventListener('dragover', swallow);
      window.removeEventListener('drop', swallow);
    };
  }, []);
  const hover = (event: DragEvent) => {
    if (!mayBeDropped(event.dataTransfer)) return;
    event.preventDefault();
    event.dataTransfer.dropEffect = 'copy';
    setOver(true);
  };
  return {
    over,
    handlers: {
      onDragEnter: hover,
      onDragOver: hover,
      onDragLeave: (event: DragEvent<HTMLElement>) => {
        if (!event.currentTarget.contains(event.relatedTarget as Node | null)) setOver(false);
      },
      onDrop: (event: DragEvent) => {
        event.preventDefault();
        setOver(false);
        const { files, refused } = droppedFiles(event.dataTransfer);
        onFiles(files, refused);
      },
    },
  };
}

/** Ctrl+V anywhere on the page, unless text is being pasted. */
function usePaste(labels: readonly string[], onFiles: Props['onFiles']) {
  useEffect(() => {
    const paste = (event: ClipboardEvent) => {
      const pictures = event.clipboardData ? pastedFiles(event.clipboardData) : [];
      if (pictures.length === 0 || event.clipboardData?.types.includes('text/plain')) return;
      event.preventDefault();
      onFiles(namePasted(pictures, labels));
    };
    document.addEventListener('paste', paste);
    return () => document.removeEventListener('paste', paste);
  });
}

const NOTHING_TO_PASTE = 'There is no picture on the clipboard. Copy one first.';
const MAY_NOT_PASTE = 'This browser does not let the page see the clipboard. Press Ctrl and V instead.';

const canReadClipboard = () => 'clipboard' in navigator && 'read' in navigator.clipboard;

/** The same for a hand without a keyboard; absent where the browser has no way to ask for the clipboard. */
function PasteButton({ labels, onFiles }: Pick<Props, 'labels' | 'onFiles'>) {
  const shown = useAwake() && canReadClipboard();
  const paste = async () => {
    try {
      const pictures = await readClipboard();
      onFiles(namePasted(pictures, labels), pictures.length === 0 ? [NOTHING_TO_PASTE] : []);
    } catch {
      onFiles([], [MAY_NOT_PASTE]);
    }
  };
  return shown ? <Button onPress={() => void paste()}>Paste a picture</Button> : null;
}

async function readClipboard(): Promise<File[]> {
  const items = await navigator.clipboard.read();
  const blobs = items.flatMap((item) => {
    const type = item.types.find((type) => type.startsWith('image/'));
    return type ? [item.getType(type)] : [];
  });
  return (await Promise.all(blobs)).map((blob) => new File([blob], '', { type: blob.type }));
}
