/** Where to go after signing in: a path of our own, or the first page. Never another site. */
export function nextPath(wanted: string | null): string {
  if (wanted === null || !wanted.startsWith('/')) return '/';
  const base = 'http://couplet.invalid';
  const url = URL.canParse(wanted, base) ? new URL(wanted, base) : null;
  if (url === null || url.origin !== base || url.pathname.startsWith('//') || url.pathname === '/sign-in') return '/';
  return url.pathname + url.search + url.hash;
}
