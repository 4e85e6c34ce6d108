import { describe, expect, test } from 'vitest';
import { nextUpload, startUploads, uploadStep, type UploadEvent, type UploadState } from '@/components/islands/sheets/upload-state';
import type { PageView, UploadAnswer } from '@/lib/contracts';

const MOST_BYTES = 1000;

const page = (id: number): PageView => ({
  id,
  label: `page ${id}`,
  picture: {
    id,
    name: `${id}.png`,
    mediaType: 'image/png',
    bytes: 10,
    width: 4,
    height: 3,
    fileSha256: '',
    pixelsSha256: '',
    notes: [],
    url: '',
  },
});
const answer = (id: number, already: UploadAnswer['already'] = []): UploadAnswer => ({ page: page(id), already });

const run = (...events: readonly UploadEvent[]): UploadState =>
  events.reduce(uploadStep, startUploads({ pages: [page(1)], mostBytes: MOST_BYTES }));
const pick = (...names: string[]): UploadEvent => ({ type: 'picked', files: names.map((name) => ({ name, size: 100 })) });
const sends = (key: number, sentBytes = 0): UploadEvent => ({ type: 'progress', key, sentBytes, processing: false });
const takesIn = (key: number): UploadEvent => ({ type: 'progress', key, sentBytes: 100, processing: true });
const states = (state: UploadState) => state.uploads.map((upload) => upload.progress.is);

test('files go one after the other, in the order in which they were picked', () => {
  const picked = run(pick('a.png', 'b.png'));
  expect(nextUpload(picked)?.name).toBe('a.png');
  expect(nextUpload(run(pick('a.png', 'b.png'), sends(1)))).toBeUndefined();
  expect(nextUpload(run(pick('a.png', 'b.png'), sends(1), takesIn(1)))).toBeUndefined();
  expect(nextUpload(run(pick('a.png', 'b.png'), sends(1), { type: 'done', key: 1, answer: answer(2) }))?.name).toBe('b.png');
});

test('a file that is sent to the last byte is being taken in, and the page follows', () => {
  const sent = run(pick('a.png'), sends(1), sends(1, 60), takesIn(1));
  expect(states(sent)).toEqual(['takingIn']);
  const done = uploadStep(sent, { type: 'done', key: 1, answer: answer(2) });
  expect(done.pages.map(({ id }) => id)).toEqual([1, 2]);
  expect(done.said).toBe('a.png is page 2.');
});

test('the status speaks at each turn, not at each byte', () => {
  const begun = run(pick('a.png'), sends(1));
  expect(begun.said).toBe('Sending a.png.');
  expect(uploadStep(begun, sends(1, 60)).said).toBe(begun.said);
});

test('a refusal stands by its file and the rest goes on', () => {
  const refused = run(pick('a.txt', 'b.png'), sends(1), { type: 'refused', key: 1, sentence: 'Not a picture.', status: 422 });
  expect(refused.uploads[0]?.progress).toMatchObject({ is: 'refused', sentence: 'Not a picture.', worthRetrying: false });
  expect(refused.said).toContain('Not a picture.');
  expect(nextUpload(refused)?.name).toBe('b.png');
});

test.each([0, 401, 429, 500, 503])('a refusal with status %i may be tried again', (status) => {
  const refused = run(pick('a.png'), sends(1), { type: 'refused', key: 1, sentence: 'Later.', status });
  expect(refused.uploads[0]?.progress).toMatchObject({ worthRetrying: true, signedOut: status === 401 });
  expect(nextUpload(uploadStep(refused, { type: 'again', key: 1 }))?.key).toBe(1);
});

test('a file that is too large is refused before it is sent, with the size that is taken', () => {
  const state = run({
    type: 'picked',
    files: [
      { name: 'big.png', size: MOST_BYTES + 1 },
      { name: 'small.png', size: MOST_BYTES },
    ],
  });
  expect(states(state)).toEqual(['refused', 'waiting']);
  expect(state.said).toContain('1 picture to send.');
  expect(state.said).toContain('big.png was not taken.');
});

test('the same file again is the page it already is', () => {
  const again = run(pick('a.png'), sends(1), { type: 'done', key: 1, answer: answer(1) });
  expect(again.pages).toHaveLength(1);
  expect(again.uploads[0]?.progress).toMatchObject({ is: 'done', again: true });
  expect(again.said).toBe('a.png is already page 1 of this sheet.');
});

test('the same file on another sheet is told with the name of that sheet', () => {
  const done = run(pick('a.png'), sends(1), { type: 'done', key: 1, answer: answer(2, [{ sheetId: 9, sheet: 'OC-118' }]) });
  expect(done.said).toBe('a.png is page 2. The same file is already on OC-118.');
});

describe('cancelling', () => {
  test('takes a file that waits out of the queue', () => {
    const state = run(pick('a.png', 'b.png'), { type: 'cancelled', key: 1 });
    expect(nextUpload(state)?.name).toBe('b.png');
  });

  test('is over when the file has become a page', () => {
    const done = run(pick('a.png'), sends(1), { type: 'done', key: 1, answer: answer(2) });
    expect(uploadStep(done, { type: 'cancelled', key: 1 })).toBe(done);
  });

  test('is not undone by a late progress', () => {
    const cancelled = run(pick('a.png'), sends(1), { type: 'cancelled', key: 1 });
    expect(uploadStep(cancelled, takesIn(1))).toBe(cancelled);
  });
});

test('clearing leaves what is not settled', () => {
  const state = run(pick('a.png', 'b.png', 'c.png'), { type: 'cancelled', key: 1 }, sends(2), { type: 'cleared' });
  expect(state.uploads.map(({ name }) => name)).toEqual(['b.png', 'c.png']);
});

test('keys are never used twice, so that a late answer finds its own file', () => {
  const state = run(pick('a.png'), { type: 'cancelled', key: 1 }, { type: 'cleared' }, pick('b.png'));
  expect(state.uploads.map(({ key }) => key)).toEqual([2]);
});

test('a page that is taken off is gone from the list', () => {
  expect(run({ type: 'removed', pageId: 1 }).pages).toEqual([]);
});
