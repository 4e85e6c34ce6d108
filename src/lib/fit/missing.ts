import type { Vector } from '@/lib/numeric';
import type { Answer, Observation } from './types';

/** Share of a direction's largest component above which a parameter counts as part of it. */
const PART = 0.2;
/** Currents, or voltages, closer than this share of each other are one and the same value. */
const SAME = 0.02;
/** A temperature difference below this, K, shows nothing of conducted heat. */
const NO_DIFFERENCE_K = 0.5;

const NAMES = ['Seebeck coefficient', 'resistance', 'thermal conductance'] as const;
const HEAT: readonly Answer[] = ['Qc', 'Qh'];

/**
 * One sentence on the chart that is missing, from what the charts show alone; null when every kind that is needed is there.
 * One current of heat is refused even where two hot sides make the rank full: there it is the change of the material with
 * temperature that speaks, not its Seebeck coefficient.
 */
export function gapOf(observations: readonly Observation[]): string | null {
  if (observations.length === 0) return 'There are no points to fit yet: frame a chart and put points on its curves.';
  const electrical = observations.filter(({ answer }) => answer === 'V' || answer === 'I' || answer === 'P');
  const heat = observations.filter(({ answer }) => HEAT.includes(answer));
  const cop = observations.filter(({ answer }) => answer === 'COP');
  if (heat.length + cop.length === 0) return `${nameOf(electrical)} alone cannot tell thermal conductance: add a chart of heat pumped.`;
  if (heat.length + electrical.length === 0) {
    return 'COP alone gives only ratios of Seebeck coefficient, resistance and thermal conductance: add a chart of heat pumped or a voltage chart.';
  }
  if ([...heat, ...cop].every(({ Tc, Th }) => Math.abs(Th - Tc) < NO_DIFFERENCE_K)) {
    return 'All points of heat stand at no temperature difference, which cannot tell thermal conductance: add points or a chart at larger temperature differences.';
  }
  return electrical.length + cop.length === 0 && drives(heat) <= 1 ? heatAlone(heat) : null;
}

/** One sentence on what to add where the kinds of charts are there but the constants still cannot be told; `weakest` is the direction seen least. */
export function tooLittle(observations: readonly Observation[], weakest: Vector | null): string {
  if (observations.every(({ answer }) => HEAT.includes(answer))) return heatAlone(observations);
  const largest = Math.max(...(weakest ?? [1]).map(Math.abs));
  const hidden = NAMES.filter((_, j) => weakest === null || Math.abs(weakest[j]!) > PART * largest);
  return `These charts together cannot tell ${hidden.join(' from ')}: add a chart of heat pumped, a voltage chart or curves at more currents and temperature differences.`;
}

function nameOf(electrical: readonly Observation[]): string {
  const answers = electrical.map(({ answer }) => answer);
  if (answers.includes('V')) return 'Voltage';
  return answers.includes('I') ? 'Current' : 'Electrical power';
}

function heatAlone(heat: readonly Observation[]): string {
  const [drive, remedy] = heat.every(({ I }) => I === undefined) ? ['voltage', 'current'] : ['current', 'voltage'];
  const subject = drives(heat) <= 1 ? `One ${drive} of heat alone` : `Heat at these few ${drive}s alone`;
  return `${subject} cannot tell Seebeck coefficient from resistance: add a ${remedy} chart or curves at more ${drive}s.`;
}

/** How many different currents and voltages the points were drawn at. */
function drives(points: readonly Observation[]): number {
  return distinct(points.flatMap(({ I }) => I ?? [])) + distinct(points.flatMap(({ V }) => V ?? []));
}

function distinct(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted.filter((value, i) => i === 0 || value - sorted[i - 1]! > SAME * Math.abs(value)).length;
}
