let down = false;
let waiting: (() => void)[] = [];
let watching = false;

const release = () => {
  const works = waiting;
  down = false;
  waiting = [];
  setTimeout(() => works.forEach((work) => work()));
};

/** Begins to follow the pointer; call it from an effect, as often as wanted. */
export function watchPointer(): void {
  if (watching) return;
  watching = true;
  window.addEventListener('pointerdown', () => (down = true), true);
  window.addEventListener('pointerup', release, true);
  window.addEventListener('pointercancel', release, true);
}

/**
 * Does something that moves the page once no button of the pointer is down. Leaving a field by pressing a button
 * would otherwise move that button from under the pointer, and the press would be lost.
 */
export function afterPointer(work: () => void): void {
  if (down) waiting.push(work);
  else work();
}
