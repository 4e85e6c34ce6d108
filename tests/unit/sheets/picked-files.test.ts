import { expect, test } from 'vitest';
import { carriesFiles, droppedFiles, mayBeDropped, namePasted, pastedFiles } from '@/components/islands/sheets/picked-files';

const png = (name: string) => new File(['x'], name, { type: 'image/png' });

/** What a browser hands over, as far as it is looked at. */
function transfer(files: readonly File[], folders: readonly string[] = [], types: readonly string[] = ['Files']): DataTransfer {
  const items = files.map((file) => ({
    getAsFile: () => file,
    webkitGetAsEntry: () => ({ isDirectory: folders.includes(file.name) }),
  }));
  return { files, items, types } as unknown as DataTransfer;
}

test('files that are dropped are taken as they are', () => {
  const { files, refused } = droppedFiles(transfer([png('a.png'), png('b.png')]));
  expect(files.map(({ name }) => name)).toEqual(['a.png', 'b.png']);
  expect(refused).toEqual([]);
});

test('a folder is refused by name and the files beside it are taken', () => {
  const { files, refused } = droppedFiles(transfer([png('a.png'), new File([], 'scans')], ['scans']));
  expect(files.map(({ name }) => name)).toEqual(['a.png']);
  expect(refused).toEqual(['scans is a folder: open it and drop the pictures that are in it.']);
});

test('a link that is dropped is answered with what to do instead', () => {
  expect(droppedFiles(transfer([], [], ['text/uri-list'])).refused[0]).toContain('Save the picture first');
});

test('text that is dragged about is left alone', () => {
  expect(mayBeDropped({ types: ['text/plain'] })).toBe(false);
  expect(mayBeDropped({ types: ['text/uri-list', 'text/html'] })).toBe(true);
  expect(carriesFiles(null)).toBe(false);
});

test('only pictures are taken from the clipboard', () => {
  const files = pastedFiles(transfer([png('image.png'), new File(['x'], 'a.txt', { type: 'text/plain' })]));
  expect(files.map(({ name }) => name)).toEqual(['image.png']);
});

test('pasted pictures without a name of their own are numbered on from those that are there', () => {
  const named = namePasted([png('image.png'), png(''), png('figure 3.png')], ['Pasted picture 4', 'd01']);
  expect(named.map(({ name }) => name)).toEqual(['Pasted picture 5.png', 'Pasted picture 6.png', 'figure 3.png']);
});

test('the first pasted picture is number one and keeps its kind', () => {
  const [named] = namePasted([new File(['x'], 'image.jpeg', { type: 'image/jpeg' })], []);
  expect(named).toMatchObject({ name: 'Pasted picture 1.jpeg', type: 'image/jpeg', size: 1 });
});
