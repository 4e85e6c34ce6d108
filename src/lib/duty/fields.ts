import { parseNumber, type ParseOptions } from '@/lib/units';
import type { Duty } from './types';

/** Names of a duty's values in an address or a form. */
export type DutyParam = 'heat' | 'cold' | 'hot' | 'current' | 'voltage' | 'air' | 'humidity';

/** One value of a duty as a person types it; limits are in its unit. */
export interface DutyField extends ParseOptions {
  readonly param: DutyParam;
  readonly key: keyof Duty;
  /** Label of the field, and how a sentence names it. */
  readonly label: string;
  readonly unit: string;
  readonly required: boolean;
}

/** Every value of a duty, in the order of the form. */
export const DUTY_FIELDS: readonly DutyField[] = [
  { param: 'heat', key: 'heatW', label: 'Heat to pump', unit: 'W', above: 0, max: 10_000, required: true },
  { param: 'cold', key: 'coldFaceC', label: 'Cold face', unit: 'C', min: -150, max: 250, required: true },
  { param: 'hot', key: 'hotFaceC', label: 'Hot face', unit: 'C', min: -150, max: 250, required: true },
  { param: 'current', key: 'maxCurrentA', label: 'Current at most', unit: 'A', above: 0, max: 1000, required: false },
  { param: 'voltage', key: 'maxVoltageV', label: 'Voltage at most', unit: 'V', above: 0, max: 1000, required: false },
  { param: 'air', key: 'ambientC', label: 'Air', unit: 'C', min: -80, max: 100, required: false },
  { param: 'humidity', key: 'humidityPercent', label: 'Relative humidity', unit: '%', above: 0, max: 100, required: false },
];

/** What somebody typed, by name of the field; what is left out is empty. */
export type DutyTexts = Readonly<Partial<Record<DutyParam, string>>>;

/** A duty, or what keeps it from being one: a sentence for each field that is wrong, labels of those still to be filled in. */
export interface ParsedDuty {
  readonly duty: Duty | null;
  readonly problems: Readonly<Partial<Record<DutyParam, string>>>;
  readonly missing: readonly string[];
}

/** Reads a duty from texts as people type them (see `parseNumber` for what a number may look like). */
export function parseDuty(texts: DutyTexts): ParsedDuty {
  const values: Partial<Record<keyof Duty, number>> = {};
  const problems: Partial<Record<DutyParam, string>> = {};
  const missing: string[] = [];
  for (const field of DUTY_FIELDS) {
    const text = texts[field.param]?.trim() ?? '';
    if (text === '') {
      if (field.required) missing.push(field.label.toLowerCase());
      continue;
    }
    const parsed = parseNumber(text, field);
    if (parsed.ok) values[field.key] = parsed.value;
    else problems[field.param] = parsed.message;
  }
  const { heatW, coldFaceC, hotFaceC, ...limits } = values;
  const whole = heatW !== undefined && coldFaceC !== undefined && hotFaceC !== undefined && Object.keys(problems).length === 0;
  return { duty: whole ? { heatW, coldFaceC, hotFaceC, ...limits } : null, problems, missing };
}

/** A duty as the names and texts of an address, which `parseDuty` reads back to the very same numbers. */
export function dutyTexts(duty: Duty): DutyTexts {
  return Object.fromEntries(DUTY_FIELDS.flatMap(({ param, key }) => (duty[key] === undefined ? [] : [[param, String(duty[key])]])));
}
