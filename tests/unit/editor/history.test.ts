import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { historyReducer, HISTORY_LIMIT, redoLabel, startHistory, undoLabel, type History } from '@/lib/editor';

/** A toy document: a count, and commands that set it or leave it alone. */
interface Count {
  readonly n: number;
}
type Step = { readonly add: number };
const rules = {
  apply: (count: Count, { add }: Step): Count => (add === 0 ? count : { n: count.n + add }),
  label: ({ add }: Step) => `add ${add}`,
};
const reduce = historyReducer(rules);
const start = startHistory<Count>({ n: 0 });
const add = (amount: number) => ({ type: 'perform', command: { add: amount } }) as const;
const preview = (amount: number) => ({ type: 'preview', command: { add: amount } }) as const;
const run = (actions: readonly Parameters<typeof reduce>[1][], from: History<Count> = start) => actions.reduce(reduce, from);

describe('undo and redo', () => {
  test('undo goes back to the very document before the step, and redo forward again', () => {
    const two = run([add(3), add(4)]);
    const back = reduce(two, { type: 'undo' });
    expect(back.present).toBe(two.past[1]!.document);
    expect(reduce(back, { type: 'redo' }).present).toBe(two.present);
  });

  test('the labels name the step that would be taken back and the one that would be done again', () => {
    const history = run([add(3), add(4), { type: 'undo' }]);
    expect([undoLabel(history), redoLabel(history)]).toEqual(['add 3', 'add 4']);
    expect([undoLabel(start), redoLabel(start)]).toEqual([null, null]);
  });

  test('a new step after an undo ends redo, a step that changes nothing does not', () => {
    const undone = run([add(3), { type: 'undo' }]);
    expect(reduce(undone, add(0)).future).toHaveLength(1);
    expect(reduce(undone, add(5)).future).toHaveLength(0);
  });

  test('undo at the beginning and redo at the end change nothing', () => {
    expect(reduce(start, { type: 'undo' })).toBe(start);
    expect(reduce(start, { type: 'redo' })).toBe(start);
  });

  test(`the oldest steps go when there are more than ${HISTORY_LIMIT}`, () => {
    const long = run(Array.from({ length: HISTORY_LIMIT + 20 }, () => add(1)));
    expect(long.past).toHaveLength(HISTORY_LIMIT);
    expect(long.past[0]!.document.n).toBe(20);
  });
});

describe('a gesture', () => {
  const dragged = run([add(1), { type: 'begin', label: 'move point' }, preview(2), preview(3)]);

  test('is one step however many previews it had, under its own label', () => {
    const done = reduce(dragged, { type: 'commit' });
    expect(done.past).toHaveLength(2);
    expect(undoLabel(done)).toBe('move point');
    expect(reduce(done, { type: 'undo' }).present.n).toBe(1);
  });

  test('that is cancelled gives back the document it began with and leaves no trace', () => {
    expect(reduce(dragged, { type: 'cancel' })).toEqual(run([add(1)]));
  });

  test('that is cancelled keeps redo', () => {
    const undone = run([add(1), add(2), { type: 'undo' }]);
    expect(run([{ type: 'begin', label: 'move point' }, preview(9), { type: 'cancel' }], undone)).toEqual(undone);
  });

  test('that comes back to where it began makes no step', () => {
    const still = run([{ type: 'begin', label: 'move point' }, preview(7), preview(-7), { type: 'commit' }], run([add(1)]));
    expect(still.past).toHaveLength(1);
    expect(undoLabel(still)).toBe('add 1');
  });

  test('refuses undo and redo while it is open', () => {
    expect(reduce(dragged, { type: 'undo' })).toBe(dragged);
    expect(reduce(dragged, { type: 'redo' })).toBe(dragged);
    expect(undoLabel(dragged)).toBeNull();
  });

  test('is closed first when another command or gesture comes', () => {
    expect(reduce(dragged, add(10)).past.map((step) => step.label)).toEqual(['add 1', 'move point', 'add 10'].slice(0, 3));
    expect(reduce(dragged, { type: 'begin', label: 'nudge' }).past).toHaveLength(2);
  });

  test('previews without a gesture change nothing', () => {
    expect(reduce(start, preview(4))).toBe(start);
  });
});

const step = fc.integer({ min: -3, max: 3 });
const action = fc.oneof(
  { weight: 4, arbitrary: step.map(add) },
  { weight: 2, arbitrary: fc.constant({ type: 'undo' } as const) },
  { weight: 1, arbitrary: fc.constant({ type: 'redo' } as const) },
  { weight: 1, arbitrary: fc.constant({ type: 'begin', label: 'drag' } as const) },
  { weight: 2, arbitrary: step.map(preview) },
  { weight: 1, arbitrary: fc.constantFrom({ type: 'commit' } as const, { type: 'cancel' } as const) },
);

describe('laws, over seeded random lists of actions', () => {
  const seed = 20260312;

  test(`as many undos as there are steps restore the start, as many redos the end (seed ${seed})`, () => {
    fc.assert(
      fc.property(fc.array(action, { maxLength: 60 }), (actions) => {
        const end = reduce(run(actions), { type: 'commit' });
        const steps = end.past.length;
        const back = run(
          Array.from({ length: steps }, () => ({ type: 'undo' }) as const),
          end,
        );
        expect(back.present).toEqual({ n: 0 });
        const forth = run(
          Array.from({ length: steps }, () => ({ type: 'redo' }) as const),
          back,
        );
        expect(forth.present).toBe(end.present);
        expect(forth.past.map(({ label }) => label)).toEqual(end.past.map(({ label }) => label));
      }),
      { seed, numRuns: 500 },
    );
  });

  test(`a history survives JSON and goes on alike (seed ${seed})`, () => {
    fc.assert(
      fc.property(fc.array(action, { maxLength: 30 }), fc.array(action, { maxLength: 30 }), (before, after) => {
        const history = run(before);
        expect(run(after, JSON.parse(JSON.stringify(history)) as History<Count>)).toEqual(run(after, history));
      }),
      { seed, numRuns: 300 },
    );
  });
});
