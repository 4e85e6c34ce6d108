import { ApiProblem, ask } from '@/components/islands/api';
import type { ReadingView, StateAnswer } from '@/lib/contracts';

export type ReadingState = StateAnswer['state'];
export type DecisionAction = 'approve' | 'return' | 'withdraw' | 'restore';

/** Where a reading stands, as far as a decision needs to know it. */
export interface Standing {
  readonly id: number;
  readonly version: number;
  readonly state: ReadingState;
}

/** What may be decided on a reading in each state. */
export const ACTIONS: Readonly<Record<ReadingState, readonly DecisionAction[]>> = {
  draft: [],
  'handed-in': ['approve', 'return'],
  returned: [],
  approved: ['withdraw'],
  superseded: [],
  withdrawn: ['restore'],
};

/** How a decision went: it was taken; what was typed has to be mended; somebody was quicker; or it failed. */
export type Outcome =
  | { readonly kind: 'done'; readonly action: DecisionAction; readonly answer: StateAnswer }
  | { readonly kind: 'field'; readonly sentence: string }
  | { readonly kind: 'lost'; readonly sentence: string }
  | { readonly kind: 'failed'; readonly sentence: string; readonly signIn: boolean };

const WORDS: Readonly<Record<ReadingState, string>> = {
  draft: 'a draft again',
  'handed-in': 'handed in again',
  returned: 'returned',
  approved: 'approved',
  superseded: 'superseded',
  withdrawn: 'withdrawn',
};

/** What happened meanwhile, from the version that won. */
function lostSentence(current: unknown): string {
  const now = current as Partial<ReadingView> | undefined;
  const last = now?.decisions?.at(-1);
  const by = last ? `, by ${last.by.name}` : '';
  return now?.state
    ? `Nothing was decided: the reading changed while you looked at it, and is ${WORDS[now.state]}${by}. Load it as it is now and look again.`
    : 'Nothing was decided: the reading changed while you looked at it. Load it as it is now and look again.';
}

function outcomeOf(problem: ApiProblem): Outcome {
  if (problem.status === 412) return { kind: 'lost', sentence: lostSentence(problem.document.current) };
  if (problem.status === 409) return { kind: 'lost', sentence: problem.detail };
  const field = problem.fields.reason;
  if (field !== undefined) return { kind: 'field', sentence: field };
  return { kind: 'failed', sentence: problem.detail, signIn: problem.status === 401 };
}

/** Sends a decision over the version that was looked at. */
export async function decide({ id, version }: Standing, action: DecisionAction, reason: string): Promise<Outcome> {
  const body = action === 'return' || action === 'withdraw' ? { reason } : {};
  try {
    const { data } = await ask<StateAnswer>(`/api/readings/${id}/${action}`, { method: 'POST', body, ifMatch: `"${version}"` });
    return { kind: 'done', action, answer: data };
  } catch (fault) {
    if (!(fault instanceof ApiProblem)) throw fault;
    return outcomeOf(fault);
  }
}

/** What is said after a decision. */
export function doneSentence(action: DecisionAction, state: ReadingState, owner: string): string {
  switch (action) {
    case 'approve':
      return 'Approved. Its model is in the catalogue now.';
    case 'return':
      return `Returned. ${owner} is told why by mail.`;
    case 'withdraw':
      return `Withdrawn. It is out of the catalogue, and ${owner} is told why by mail.`;
    case 'restore':
      return state === 'approved'
        ? 'Restored. Its model is in the catalogue again.'
        : 'Restored as superseded, because a newer reading stands in the catalogue.';
  }
}
