import { can, type Actor } from '@/lib/access';

/** "5 curves on 2 charts", "no chart yet". */
export function progressWords({ charts, curves }: { charts: number; curves: number }): string {
  const count = (n: number, one: string) => `${n} ${n === 1 ? one : `${one}s`}`;
  if (charts === 0) return 'no chart yet';
  return curves === 0 ? `${count(charts, 'chart')}, no curve yet` : `${count(curves, 'curve')} on ${count(charts, 'chart')}`;
}

export interface NextStep {
  readonly label: string;
  readonly href: string;
}

/** What a person most likely wants to begin with, by what they may do. */
export function firstStep(actor: Actor): NextStep | null {
  if (can(actor, 'reading.start')) return { label: 'Read a sheet', href: '/sheets' };
  if (can(actor, 'duty.search')) return { label: 'Find modules for a duty', href: '/duty' };
  if (can(actor, 'outbox.see')) return { label: 'Look at the outbox', href: '/admin/outbox' };
  return null;
}
