import type { ReactNode } from 'react';
import { chipClass, stateWords, type ChipTone, type ReadingState } from './chip-tones';

/** A short word on a tint: a state, a grade, a verdict. */
export const Chip = ({ tone = 'plain', children }: { tone?: ChipTone; children: ReactNode }) => (
  <span className={chipClass(tone)}>{children}</span>
);

/** The state of a reading, in the words of the product. */
export function StateChip({ state }: { state: ReadingState }) {
  const { tone, text } = stateWords(state);
  return <Chip tone={tone}>{text}</Chip>;
}
