import { brief } from './text';
import { MISS_KINDS, type Duty, type MissKind } from './types';

type Wording = (duty: Duty) => readonly [one: string, several: string];

const WORDS: Readonly<Record<MissKind, Wording>> = {
  deltaT: () => ['cannot span the ΔT', 'cannot span the ΔT'],
  heat: () => ['reaches too little heat', 'reach too little heat'],
  current: ({ maxCurrentA = NaN }) => [`needs more than ${brief(maxCurrentA, 'A')}`, `need more than ${brief(maxCurrentA, 'A')}`],
  allowedCurrent: () => ['needs more current than its sheet allows', 'need more current than their sheets allow'],
  voltage: ({ maxVoltageV = NaN }) => [`needs more than ${brief(maxVoltageV, 'V')}`, `need more than ${brief(maxVoltageV, 'V')}`],
  temperature: () => ['may not be that hot', 'may not be that hot'],
  flowsAnyhow: () => ['lets more heat through by itself', 'let more heat through by themselves'],
};

/** Why modules miss a duty, with how many: "12 reach too little heat, 1 needs more than 6 A"; empty when none misses. */
export function missSummary(duty: Duty, counts: Readonly<Record<MissKind, number>>): string {
  return MISS_KINDS.filter((kind) => counts[kind] > 0)
    .map((kind) => `${counts[kind]} ${WORDS[kind](duty)[counts[kind] === 1 ? 0 : 1]}`)
    .join(', ');
}
