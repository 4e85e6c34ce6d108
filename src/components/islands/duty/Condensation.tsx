import type { DutyAnswer } from '@/lib/contracts';
import type { Duty } from '@/lib/duty';
import { formatWithUnit } from '@/lib/units';

/** Nearer than this to the dew point a cold face is said to be close to it, K (a choice, no source). */
const CLOSE_K = 3;

type Found = NonNullable<DutyAnswer['condensation']>;

const celsius = (value: number) => formatWithUnit(value, 'C', { decimals: 1 });
const kelvin = (value: number) => formatWithUnit(Math.abs(value), 'K', { decimals: 1 });

function heading({ kind, reserveK }: Found, coldFaceC: number): string {
  if (reserveK >= CLOSE_K) return 'It stays dry.';
  if (reserveK >= 0) return 'It stays dry, but only just.';
  if (kind === 'frost') return 'Ice will form.';
  return coldFaceC < 0 ? 'Water will form and freeze.' : 'Water will form.';
}

function sentence({ kind, celsius: point, reserveK }: Found, coldFaceC: number): string {
  const name = kind === 'frost' ? 'frost point' : 'dew point';
  const side = reserveK < 0 ? 'below' : 'above';
  const advice = reserveK < 0 ? ': seal the gap, insulate, and lead the water off' : '';
  return `The cold face at ${celsius(coldFaceC)} lies ${kelvin(reserveK)} ${side} the ${name} of ${celsius(point)}${advice}.`;
}

/** Whether the cold face of a duty sweats or frosts in the air around it. */
export function Condensation({ duty, found }: { duty: Duty; found: DutyAnswer['condensation'] }) {
  if (!found) return <p className="hint mt-3">Give the air and its humidity to learn whether water forms on the cold face.</p>;
  const wet = found.reserveK < CLOSE_K;
  return (
    <p className={wet ? 'notice notice-attention mt-4' : 'notice mt-4'}>
      <b>{heading(found, duty.coldFaceC)}</b> {sentence(found, duty.coldFaceC)}
    </p>
  );
}
