import { ApiProblem } from '@/components/islands/api';
import type { CurrentVersion, SaveAnswer } from '@/lib/contracts';
import { sameDocument, type BenchDocument } from '@/lib/editor';

/** How the draft stands to the server. */
export type SaveState =
  | { readonly kind: 'saved'; readonly at: string }
  | { readonly kind: 'saving' }
  /** Will be tried again by itself. */
  | { readonly kind: 'failed'; readonly why: string }
  | { readonly kind: 'signedOut' }
  /** The server will not take it; trying again does not help by itself. */
  | { readonly kind: 'refused'; readonly why: string }
  | { readonly kind: 'conflict'; readonly current: CurrentVersion };

/** What the saver needs of the world; all of it can be played in a test. */
export interface SaverSeams {
  readonly put: (document: BenchDocument, version: number) => Promise<SaveAnswer>;
  readonly keep: (document: BenchDocument, version: number) => Promise<void>;
  readonly forget: () => Promise<void>;
  /** Runs `task` after so many milliseconds; the answer takes it back. */
  readonly after: (milliseconds: number, task: () => void) => () => void;
}

/** Quiet time after a change before it is sent, and before it is kept in the browser. */
export const SAVE_AFTER_MS = 800;
export const KEEP_AFTER_MS = 150;
const RETRY_AFTER_MS = [2000, 4000, 8000, 15_000, 30_000] as const;

/** Whether the same save may succeed later. */
const isPassing = (problem: ApiProblem): boolean =>
  problem.offline || problem.status >= 500 || problem.status === 429 || problem.status === 408;

const currentOf = (problem: ApiProblem): CurrentVersion | null => {
  const current = problem.document['current'] as Partial<CurrentVersion> | undefined;
  return current?.document && typeof current.version === 'number' ? (current as CurrentVersion) : null;
};

/** Saves a draft by itself: one save in flight, the newest state last, nothing lost when a save fails. */
export class Saver {
  private readonly listeners = new Set<() => void>();
  private confirmed: BenchDocument;
  private latest: BenchDocument;
  private version: number;
  private savedAt: string;
  private now: SaveState;
  private failures = 0;
  private inFlight: Promise<void> | null = null;
  private stopped = false;
  private cancelSend = () => {};
  private cancelKeep = () => {};

  constructor(
    start: { readonly document: BenchDocument; readonly version: number; readonly savedAt: string },
    private readonly seams: SaverSeams,
  ) {
    this.confirmed = this.latest = start.document;
    this.version = start.version;
    this.savedAt = start.savedAt;
    this.now = { kind: 'saved', at: start.savedAt };
  }

  readonly state = (): SaveState => this.now;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => void this.listeners.delete(listener);
  };

  /** Whether there is anything the server has not confirmed. */
  unsaved(): boolean {
    return !sameDocument(this.latest, this.confirmed);
  }

  /** The version that the server confirmed last. */
  confirmedVersion(): number {
    return this.version;
  }

  /** The draft is now this. */
  changed(document: BenchDocument): void {
    if (document === this.latest) return;
    this.latest = document;
    if (!this.unsaved() && !this.inFlight && this.now.kind !== 'conflict') return this.settled();
    this.cancelKeep();
    this.cancelKeep = this.seams.after(KEEP_AFTER_MS, () => void this.seams.keep(this.latest, this.version));
    if (this.now.kind === 'conflict' || this.now.kind === 'signedOut') return;
    if (this.now.kind !== 'saving') this.become({ kind: 'saving' });
    if (!this.inFlight) this.sendAfter(SAVE_AFTER_MS);
  }

  /** Saves now, without waiting; resolves when nothing is in flight any more. */
  async flush(): Promise<void> {
    this.cancelSend();
    await this.inFlight;
    await this.send();
  }

  /** After a lost race: saves mine over the version that won. */
  keepMine(): void {
    if (this.now.kind !== 'conflict') return;
    this.version = this.now.current.version;
    this.become({ kind: 'saving' });
    this.sendAfter(0);
  }

  /** After a lost race: goes on from the version that won, which the caller then lays into the draft. */
  takeTheirs(): void {
    if (this.now.kind !== 'conflict') return;
    const { current } = this.now;
    this.latest = current.document;
    this.confirm(current.document, current);
  }

  stop(): void {
    this.stopped = true;
    this.cancelSend();
    this.cancelKeep();
  }

  private become(next: SaveState): void {
    this.now = next;
    for (const listener of this.listeners) listener();
  }

  private sendAfter(milliseconds: number): void {
    this.cancelSend();
    this.cancelSend = this.seams.after(milliseconds, () => void this.send());
  }

  private settled(): void {
    this.cancelSend();
    this.cancelKeep();
    void this.seams.forget();
    this.become({ kind: 'saved', at: this.savedAt });
  }

  private async send(): Promise<void> {
    if (this.inFlight || this.stopped || this.now.kind === 'conflict' || !this.unsaved()) return;
    const sent = this.latest;
    this.become({ kind: 'saving' });
    this.inFlight = this.seams.put(sent, this.version).then(
      (answer) => this.landed(() => this.confirm(sent, answer)),
      (fault: unknown) => this.landed(() => this.fail(sent, fault)),
    );
    await this.inFlight;
  }

  private landed(next: () => void): void {
    this.inFlight = null;
    if (!this.stopped) next();
  }

  private confirm(document: BenchDocument, answer: { readonly version: number; readonly savedAt: string }): void {
    this.failures = 0;
    this.confirmed = document;
    this.version = answer.version;
    this.savedAt = answer.savedAt;
    if (this.unsaved()) this.sendAfter(0);
    else this.settled();
  }

  private fail(sent: BenchDocument, fault: unknown): void {
    const problem = fault instanceof ApiProblem ? fault : null;
    const current = problem?.status === 412 ? currentOf(problem) : null;
    if (current && sameDocument(current.document, sent)) return this.confirm(sent, current);
    if (current) return this.become({ kind: 'conflict', current });
    if (problem?.status === 401) return this.become({ kind: 'signedOut' });
    if (problem && !isPassing(problem)) return this.become({ kind: 'refused', why: problem.detail });
    this.become({ kind: 'failed', why: problem?.detail ?? 'The server could not be asked. It will be tried again.' });
    this.sendAfter(RETRY_AFTER_MS[Math.min(this.failures++, RETRY_AFTER_MS.length - 1)] ?? 0);
  }
}
