import { chipClass, stateWords, type ReadingState } from '@/components/ui/chip-tones';

/** The chip at the head of a page is drawn by the server; this makes it say what is true now. */
export function showState(holder: string, state: ReadingState): void {
  const chip = document.getElementById(holder)?.querySelector('.chip');
  if (!chip) return;
  const { tone, text } = stateWords(state);
  chip.className = chipClass(tone);
  chip.textContent = text;
}
