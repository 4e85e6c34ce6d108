/** Files that came by drop or paste, and a sentence for what cannot be taken. */
export interface Picked {
  readonly files: readonly File[];
  readonly refused: readonly string[];
}

/** The part of a DataTransfer that is looked at here. */
type Transfer = Pick<DataTransfer, 'items' | 'files' | 'types'>;

const PASTED = /^Pasted picture (\d+)$/;
/** The name that browsers give to a picture pasted without a file. */
const NAMELESS = /^(image|clipboard|blob)?(\.[a-z]+)?$/i;

export const carriesFiles = (transfer: Pick<DataTransfer, 'types'> | null): boolean => transfer?.types.includes('Files') ?? false;

/** A file, or something else that deserves a sentence; text dragged about is left alone. */
export const mayBeDropped = (transfer: Pick<DataTransfer, 'types'>): boolean =>
  carriesFiles(transfer) || transfer.types.includes('text/uri-list');

const isFolder = (item: DataTransferItem) => item.webkitGetAsEntry?.()?.isDirectory ?? false;

/** What was dropped: files as they are; a folder or a picture dragged out of a page is refused in a sentence. */
export function droppedFiles(transfer: Transfer): Picked {
  const folders = [...transfer.items].filter(isFolder).map((item) => item.getAsFile()?.name ?? 'One thing');
  const files = [...transfer.files].filter((file) => !folders.includes(file.name));
  const refused = folders.map((name) => `${name} is a folder: open it and drop the pictures that are in it.`);
  if (files.length + refused.length > 0) return { files, refused };
  return { files, refused: ['That is not a file. Save the picture first, or copy it and paste it here.'] };
}

/** The pictures on a clipboard; none when text is being pasted. */
export const pastedFiles = (transfer: Transfer): readonly File[] => [...transfer.files].filter((file) => file.type.startsWith('image/'));

/** Gives pasted pictures names to tell them apart by; `labels` are those in use already. */
export function namePasted(files: readonly File[], labels: readonly string[]): File[] {
  let last = Math.max(0, ...labels.map((label) => Number(PASTED.exec(label)?.[1] ?? 0)));
  return files.map((file) => {
    if (!NAMELESS.test(file.name)) return file;
    last += 1;
    return new File([file], `Pasted picture ${last}.${file.type.split('/')[1]?.split('+')[0] ?? 'png'}`, { type: file.type });
  });
}
