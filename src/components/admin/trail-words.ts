import type { TrailEntry } from '@/lib/contracts';

const PLACES: Readonly<Record<string, string>> = { reading: '/review/', sheet: '/sheets/', module: '/modules/' };

/** What an entry is about, in words, and the page that shows it where there is one. */
export function objectOf({ object, objectName }: Pick<TrailEntry, 'object' | 'objectName'>): { text: string; href: string | null } {
  if (object === '') return { text: '', href: null };
  const [kind = '', id = ''] = object.split('/');
  if (kind === 'person') return { text: objectName || 'a person who is gone', href: '/admin/team' };
  const place = PLACES[kind];
  return { text: `${kind} ${id}`, href: place ? `${place}${id}` : null };
}

const LONGEST = 120;

/** The detail of an entry in one line where it is short; null where it needs room. */
export function shortDetail(detail: TrailEntry['detail']): string | null {
  const parts = Object.entries(detail).map(([key, value]) => {
    const text = Array.isArray(value) ? value.join(', ') : typeof value === 'object' ? null : String(value);
    return text === null ? null : `${key}: ${text}`;
  });
  const line = parts.join('; ');
  return parts.includes(null) || line.length > LONGEST ? null : line;
}
