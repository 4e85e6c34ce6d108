import { z } from 'zod';
import { changePasswordBody } from '@/lib/contracts';

/** What a form of the account page asks for. */
export type Wish =
  | { readonly do: 'password'; readonly current: string; readonly next: string }
  | { readonly do: 'end-session'; readonly session: string }
  | { readonly do: 'theme'; readonly theme: 'light' | 'dark' | null }
  | { readonly do: 'nothing' };

export type Read = { readonly ok: true; readonly wish: Wish } | { readonly ok: false; readonly problems: Record<string, string> };

/** Reads a posted form of the account page; a faulty password form gives one sentence a field. */
export function readWish(form: FormData): Read {
  const text = (name: string) => String(form.get(name) ?? '');
  switch (text('do')) {
    case 'password': {
      const parsed = changePasswordBody.safeParse({ current: text('current'), next: text('next') });
      if (parsed.success) return { ok: true, wish: { do: 'password', ...parsed.data } };
      const { fieldErrors } = z.flattenError(parsed.error);
      return {
        ok: false,
        problems: Object.fromEntries(Object.entries(fieldErrors).map(([field, sentences]) => [field, sentences[0] ?? ''])),
      };
    }
    case 'end-session':
      return { ok: true, wish: { do: 'end-session', session: text('session') } };
    case 'theme': {
      const theme = text('theme');
      return { ok: true, wish: { do: 'theme', theme: theme === 'light' || theme === 'dark' ? theme : null } };
    }
    default:
      return { ok: true, wish: { do: 'nothing' } };
  }
}
