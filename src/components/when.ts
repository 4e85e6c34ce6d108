const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];
const two = (n: number) => String(n).padStart(2, '0');

/** Day of an ISO instant or date: "12 Nov 2026", in UTC so that all see the same. */
export function formatDate(iso: string): string {
  const at = new Date(iso);
  return Number.isNaN(at.getTime()) ? '–' : `${at.getUTCDate()} ${MONTHS[at.getUTCMonth()]} ${at.getUTCFullYear()}`;
}

/** Day and time of an ISO instant: "12 Nov 2026, 14:05 UTC". */
export function formatInstant(iso: string): string {
  const at = new Date(iso);
  return Number.isNaN(at.getTime()) ? '–' : `${formatDate(iso)}, ${two(at.getUTCHours())}:${two(at.getUTCMinutes())} UTC`;
}
