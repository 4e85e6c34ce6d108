import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { ApiProblem } from '@/components/islands/api';
import { KEEP_AFTER_MS, SAVE_AFTER_MS, Saver, type SaverSeams } from '@/components/islands/bench/state/saver';
import { apply, emptyDocument, type BenchDocument } from '@/lib/editor';

const noted = (note: string): BenchDocument => apply(emptyDocument(), { type: 'setNote', note });
const start = { document: noted('as loaded'), version: 3, savedAt: '2026-03-12T12:04:00.000Z' };

type Answer = { version: number; savedAt: string } | ApiProblem;

/** A world of its own for a saver: time that is moved by hand, and a server that answers when it is told to. */
function world() {
  let now = 0;
  let tasks: { at: number; task: () => void }[] = [];
  const sent: { document: BenchDocument; version: number; answer: (answer: Answer) => Promise<void> }[] = [];
  const kept: BenchDocument[] = [];
  let forgotten = 0;
  const seams: SaverSeams = {
    put: (document, version) =>
      new Promise((resolve, reject) => {
        const answer = async (given: Answer) => {
          if (given instanceof ApiProblem) reject(given);
          else resolve(given);
          await new Promise((done) => setTimeout(done, 0));
        };
        sent.push({ document, version, answer });
      }),
    keep: async (document) => void kept.push(document),
    forget: async () => void forgotten++,
    after: (milliseconds, task) => {
      const entry = { at: now + milliseconds, task };
      tasks.push(entry);
      return () => void (tasks = tasks.filter((other) => other !== entry));
    },
  };
  const pass = (milliseconds: number) => {
    now += milliseconds;
    const due = tasks.filter(({ at }) => at <= now);
    tasks = tasks.filter(({ at }) => at > now);
    for (const { task } of due) task();
  };
  return { saver: new Saver(start, seams), sent, kept, pass, forgotten: () => forgotten };
}

const saved = (version: number) => ({ version, savedAt: `2026-03-12T12:${String(10 + version)}:00.000Z` });
const current = { version: 9, document: noted('by another'), savedAt: '2026-03-12T12:30:00.000Z', savedBy: { id: 'p2', name: 'Petra' } };
const lostRace = new ApiProblem(412, 'Somebody else saved first.', {}, { current });

describe('saving by itself', () => {
  test('a change is sent after a quiet while, with the version it was made on, and confirmed', async () => {
    const { saver, sent, pass } = world();
    saver.changed(noted('a'));
    pass(SAVE_AFTER_MS - 1);
    expect(sent).toHaveLength(0);
    pass(1);
    expect(sent[0]).toMatchObject({ document: noted('a'), version: 3 });
    await sent[0]!.answer(saved(4));
    expect([saver.state(), saver.unsaved(), saver.confirmedVersion()]).toEqual([{ kind: 'saved', at: saved(4).savedAt }, false, 4]);
  });

  test('only one save is in flight; what changed meanwhile follows on the new version', async () => {
    const { saver, sent, pass } = world();
    saver.changed(noted('a'));
    pass(SAVE_AFTER_MS);
    saver.changed(noted('b'));
    saver.changed(noted('c'));
    pass(10 * SAVE_AFTER_MS);
    expect(sent).toHaveLength(1);
    await sent[0]!.answer(saved(4));
    pass(0);
    expect(sent[1]).toMatchObject({ document: noted('c'), version: 4 });
  });

  test('work is kept in the browser until the server has it, and then forgotten', async () => {
    const { saver, sent, kept, pass, forgotten } = world();
    saver.changed(noted('a'));
    pass(KEEP_AFTER_MS);
    expect(kept).toEqual([noted('a')]);
    pass(SAVE_AFTER_MS);
    expect(forgotten()).toBe(0);
    await sent[0]!.answer(saved(4));
    expect(forgotten()).toBe(1);
  });

  test('a change that is undone before it was sent is not sent at all', () => {
    const { saver, sent, pass } = world();
    saver.changed(noted('a'));
    saver.changed(start.document);
    pass(10 * SAVE_AFTER_MS);
    expect([sent.length, saver.state().kind]).toEqual([0, 'saved']);
  });

  test('a server that does not answer is asked again, later and later', async () => {
    const { saver, sent, pass } = world();
    saver.changed(noted('a'));
    pass(SAVE_AFTER_MS);
    await sent[0]!.answer(new ApiProblem(0, 'The server cannot be reached.'));
    expect(saver.state()).toEqual({ kind: 'failed', why: 'The server cannot be reached.' });
    pass(2000);
    await sent[1]!.answer(new ApiProblem(503, 'Busy.'));
    pass(2000);
    expect(sent).toHaveLength(2);
    pass(2000);
    await sent[2]!.answer(saved(4));
    expect(saver.state().kind).toBe('saved');
  });

  test('a refusal stands until something changes or it is asked for', async () => {
    const { saver, sent, pass } = world();
    saver.changed(noted('a'));
    pass(SAVE_AFTER_MS);
    await sent[0]!.answer(new ApiProblem(409, 'This reading was handed in.'));
    pass(100_000);
    expect([sent.length, saver.state()]).toEqual([1, { kind: 'refused', why: 'This reading was handed in.' }]);
    void saver.flush();
    await Promise.resolve();
    expect(sent).toHaveLength(2);
  });

  test('an expired session keeps the work, and goes on when it is asked to after signing in', async () => {
    const { saver, sent, kept, pass } = world();
    saver.changed(noted('a'));
    pass(SAVE_AFTER_MS);
    await sent[0]!.answer(new ApiProblem(401, 'Sign in.'));
    saver.changed(noted('b'));
    pass(100_000);
    expect([saver.state().kind, kept.at(-1), sent.length]).toEqual(['signedOut', noted('b'), 1]);
    const flushed = saver.flush();
    await Promise.resolve();
    await sent[1]!.answer(saved(4));
    await flushed;
    expect([sent[1]!.document, saver.state().kind]).toEqual([noted('b'), 'saved']);
  });
});

describe('a lost race', () => {
  const lose = async () => {
    const it = world();
    it.saver.changed(noted('mine'));
    it.pass(SAVE_AFTER_MS);
    await it.sent[0]!.answer(lostRace);
    return it;
  };

  test('shows the version that won and sends nothing by itself', async () => {
    const { saver, sent, pass } = await lose();
    saver.changed(noted('mine too'));
    pass(100_000);
    expect([saver.state(), sent.length]).toEqual([{ kind: 'conflict', current }, 1]);
  });

  test('mine is kept by saving it over the version that won', async () => {
    const { saver, sent, pass } = await lose();
    saver.keepMine();
    pass(0);
    expect(sent[1]).toMatchObject({ document: noted('mine'), version: 9 });
    await sent[1]!.answer(saved(10));
    expect(saver.state().kind).toBe('saved');
  });

  test('theirs is taken without sending anything', async () => {
    const { saver, sent, pass } = await lose();
    saver.takeTheirs();
    saver.changed(structuredClone(current.document));
    pass(100_000);
    expect([saver.state(), saver.unsaved(), sent.length]).toEqual([{ kind: 'saved', at: current.savedAt }, false, 1]);
  });

  test('with a version that says the same is no lost race: the answer to that save was lost', async () => {
    const { saver, sent, pass } = world();
    saver.changed(current.document);
    pass(SAVE_AFTER_MS);
    await sent[0]!.answer(lostRace);
    expect([saver.state().kind, saver.confirmedVersion()]).toEqual(['saved', 9]);
  });
});

describe('whatever happens', () => {
  const seed = 20260716;
  const happening = fc.oneof(
    { weight: 4, arbitrary: fc.nat({ max: 5 }).map((n) => ({ change: n })) },
    { weight: 4, arbitrary: fc.constantFrom(10, SAVE_AFTER_MS, 5000).map((ms) => ({ pass: ms })) },
    { weight: 3, arbitrary: fc.constantFrom('saved' as const, 'offline' as const, 'busy' as const).map((answer) => ({ answer })) },
  );

  test(`there is never more than one save in flight, and a server that comes back gets the newest state (seed ${seed})`, async () => {
    await fc.assert(
      fc.asyncProperty(fc.array(happening, { maxLength: 40 }), async (list) => {
        const { saver, sent, pass } = world();
        let version = 3;
        let answered = 0;
        let latest = start.document;
        const answerNext = async (kind: 'saved' | 'offline' | 'busy') => {
          const next = sent[answered];
          if (!next) return;
          answered++;
          await next.answer(kind === 'saved' ? saved(++version) : new ApiProblem(kind === 'offline' ? 0 : 503, kind));
        };
        for (const it of list) {
          if ('change' in it) saver.changed((latest = noted(String(it.change))));
          if ('pass' in it) pass(it.pass);
          if ('answer' in it) await answerNext(it.answer);
          expect(sent.length - answered).toBeLessThanOrEqual(1);
        }
        for (let round = 0; round < 10 && saver.unsaved(); round++) {
          pass(60_000);
          await answerNext('saved');
        }
        expect(saver.unsaved()).toBe(false);
        if (sent.length > 0 && version > 3) expect(sent.filter((_, at) => at < answered).length).toBe(answered);
        expect(saver.state().kind === 'saved' && latest).toEqual(latest);
      }),
      { seed, numRuns: 150 },
    );
  });
});
