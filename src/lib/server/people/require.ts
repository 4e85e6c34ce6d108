import { can, type Access, type Action, type Actor } from '@/lib/access';
import { notAllowed } from '../refusal';

/** Goes on only where the matrix allows it; for one thing, give its owner and editors. */
export function requireCan(actor: Actor, action: Action, object?: Access, sentence?: string): void {
  if (!can(actor, action, object)) throw notAllowed(sentence);
}
