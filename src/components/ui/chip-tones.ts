import { classes } from './classes';

export type ChipTone = 'plain' | 'approved' | 'attention' | 'violet' | 'quiet';
export type ReadingState = 'draft' | 'handed-in' | 'returned' | 'approved' | 'superseded' | 'withdrawn';
export type Grade = 'measured' | 'curves' | 'ratings';

/** Written out, so that the style sheet keeps them. */
const TONES: Readonly<Record<ChipTone, string>> = {
  plain: '',
  approved: 'chip-approved',
  attention: 'chip-attention',
  violet: 'chip-violet',
  quiet: 'chip-quiet',
};

export const chipClass = (tone: ChipTone): string => classes('chip', TONES[tone]);

const STATES: Readonly<Record<ReadingState, { tone: ChipTone; text: string }>> = {
  draft: { tone: 'plain', text: 'draft' },
  'handed-in': { tone: 'violet', text: 'handed in' },
  returned: { tone: 'attention', text: 'returned' },
  approved: { tone: 'approved', text: 'approved' },
  superseded: { tone: 'quiet', text: 'superseded' },
  withdrawn: { tone: 'quiet', text: 'withdrawn' },
};

/** Tone and words for the state of a reading. */
export const stateWords = (state: ReadingState): { tone: ChipTone; text: string } => STATES[state];

/** What a model rests on, as a chip: measured is the strongest, ratings the weakest. */
export const gradeWords = (grade: Grade): { tone: ChipTone; text: string } => ({
  tone: grade === 'measured' ? 'approved' : grade === 'ratings' ? 'quiet' : 'plain',
  text: grade,
});
