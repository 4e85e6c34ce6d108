const YEAR_SECONDS = 31_536_000;

/** Takes a theme at once and for the next visits; `system` follows the system again. */
export function setTheme(choice: string): void {
  const set = choice === 'light' || choice === 'dark';
  if (set) document.documentElement.dataset.theme = choice;
  else delete document.documentElement.dataset.theme;
  for (const radio of document.querySelectorAll<HTMLInputElement>('input[type=radio][name=theme]'))
    radio.checked = radio.value === (set ? choice : 'system');
  document.cookie = `theme=${set ? choice : ''}; Path=/; SameSite=Lax; Max-Age=${set ? YEAR_SECONDS : 0}`;
}
