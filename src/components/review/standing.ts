import type { DecisionView, EvidenceView } from '@/lib/contracts';

const DECISIONS: Readonly<Record<DecisionView['what'], string>> = {
  'handed-in': 'Handed in',
  'taken-back': 'Taken back',
  returned: 'Returned',
  approved: 'Approved',
  superseded: 'Superseded by a newer reading',
  withdrawn: 'Withdrawn',
  restored: 'Restored',
};

export const decisionWords = (what: DecisionView['what']): string => DECISIONS[what];

const OWN_WORK = 'You worked on this reading yourself, so another librarian decides.';

/** Why this person is not asked to decide, in a sentence; null where they are. */
export function whyNotAsked({ reading, mayDecide, ownWork }: EvidenceView, isLibrarian: boolean): string | null {
  switch (reading.state) {
    case 'draft':
      return 'This is a draft: there is nothing to decide until it is handed in.';
    case 'returned':
      return `It was returned and is with ${reading.owner.name} now.`;
    case 'superseded':
      return 'A newer reading of this module was approved after it, so it stays as it is.';
    default:
  }
  if (mayDecide) return null;
  if (ownWork && isLibrarian) return OWN_WORK;
  return {
    'handed-in': 'It waits for a librarian to decide.',
    approved: 'It is approved. A librarian can withdraw it.',
    withdrawn: 'It was withdrawn. A librarian can restore it.',
  }[reading.state];
}

/** Reason of the last return or withdrawal, while the reading is in that state. */
export function standingReason({ reading }: Pick<EvidenceView, 'reading'>): string | null {
  const { state, decisions } = reading;
  if (state !== 'returned' && state !== 'withdrawn') return null;
  return decisions.findLast((decision) => decision.what === state)?.reason ?? null;
}
