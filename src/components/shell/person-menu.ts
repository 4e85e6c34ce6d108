import { forgetUnsavedWork } from './unsaved-work';
import { setTheme } from './theme';

/** Esc and a press elsewhere close the menu; a theme is taken at once; signing out first forgets unsaved work kept in this browser. */
export function startPersonMenu(): void {
  const menu = document.querySelector<HTMLDetailsElement>('details.person');
  if (!menu) return;
  closeFromOutside(menu);
  chooseTheme(menu);
  signOut(menu);
}

function closeFromOutside(menu: HTMLDetailsElement) {
  document.addEventListener('pointerdown', (event) => {
    if (menu.open && !menu.contains(event.target as Node)) menu.open = false;
  });
  menu.addEventListener('keydown', (event) => {
    if (event.key !== 'Escape' || !menu.open) return;
    menu.open = false;
    menu.querySelector('summary')?.focus();
  });
}

function chooseTheme(menu: HTMLDetailsElement) {
  const choice = menu.querySelector<HTMLFieldSetElement>('[data-theme-choice]');
  if (!choice) return;
  choice.hidden = false;
  choice.addEventListener('change', (event) => setTheme((event.target as HTMLInputElement).value));
}

function signOut(menu: HTMLDetailsElement) {
  const form = menu.querySelector<HTMLFormElement>('[data-sign-out]');
  form?.addEventListener('submit', async (event) => {
    event.preventDefault();
    await forgetUnsavedWork(menu.dataset.person ?? '');
    form.submit();
  });
}
