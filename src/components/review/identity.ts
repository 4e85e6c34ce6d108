import { ATMOSPHERE, BASIS, IMAX_MEANS } from '@/components/islands/sheets/rating-words';
import { count, exact, partName, plateText, ratingText } from '@/components/sheets/words';
import type { ModuleView, Rating } from '@/lib/contracts';
import { NOT_STATED } from '@/lib/units';
import { axisText, familyText, sideText } from './axis-words';
import type { ChartEvidence } from './charts';

/** One thing to hold against the sheet. */
export interface Check {
  readonly what: string;
  readonly value: string;
}

const stated = (value: number | null, unit: string) => (value === null ? NOT_STATED : exact(value, unit));

const labelOf = (choices: readonly { readonly id: string; readonly label: string }[], id: string) =>
  choices.find((choice) => choice.id === id)?.label ?? id;

function ratingCheck(rating: Rating): Check {
  const means = [
    `Imax: ${labelOf(IMAX_MEANS, rating.imaxMeans)}`,
    `basis: ${labelOf(BASIS, rating.basis)}`,
    `atmosphere: ${labelOf(ATMOSPHERE, rating.atmosphere)}`,
    `tolerance: ${rating.tolerancePercent === null ? 'not stated' : `± ${exact(rating.tolerancePercent, '%')}`}`,
  ];
  return {
    what: `Ratings at ${exact(rating.hotSideC, 'C')}`,
    value: `${ratingText(rating).replace(/^[^:]+: /, '')} (${means.join(', ')})`,
  };
}

/** Identity and ratings of a module as they were typed off the sheet. */
export function moduleChecks(module: ModuleView): Check[] {
  const acAt = module.acResistanceAtC === null ? '' : ` at ${exact(module.acResistanceAtC, 'C')}`;
  const body = [module.stages !== null && count(module.stages, 'stage'), module.couples !== null && count(module.couples, 'couple')];
  return [
    { what: 'Vendor and part', value: `${module.vendor.name}, ${partName(module)}` },
    { what: 'Stages and couples', value: body.filter(Boolean).join(', ') || NOT_STATED },
    { what: 'Cold plate', value: plateText(module.coldPlateMm) ?? NOT_STATED },
    { what: 'Hot plate', value: plateText(module.hotPlateMm) ?? NOT_STATED },
    { what: 'Height', value: stated(module.heightMm, 'mm') },
    { what: 'Highest temperature', value: stated(module.maxTemperatureC, 'C') },
    { what: 'Lead resistance', value: stated(module.leadsOhm, 'ohm') },
    { what: 'Sealing', value: module.sealing ?? NOT_STATED },
    { what: 'AC resistance', value: module.acResistanceOhm === null ? NOT_STATED : `${exact(module.acResistanceOhm, 'ohm')}${acAt}` },
    ...module.ratings.map(ratingCheck),
  ];
}

/** Quantities, units and side of every chart. */
export const chartChecks = (charts: readonly ChartEvidence[]): Check[] =>
  charts.map(({ name, chart }, at) => ({
    what: `Chart ${at + 1}, ${name}`,
    value: `x: ${axisText(chart.x)}; y: ${axisText(chart.y)}; ${familyText(chart)}; ${sideText(chart)}`,
  }));
