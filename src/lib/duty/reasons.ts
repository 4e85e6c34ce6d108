import type { Kelvin } from '@/lib/units';
import type { Form } from './form';
import { apart, brief } from './text';
import type { Candidate, Duty, MissReason, WorkingPoint } from './types';

interface State {
  readonly form: Form;
  readonly Tc: Kelvin;
  readonly Th: Kelvin;
}

/** Why no current pumps the heat: the ΔT is out of reach altogether, or the most heat is too little. */
export function whyNoCurrent({ form, Tc, Th }: State): MissReason {
  const largest = form.largestDeltaT(Th).deltaTK;
  if (Th - Tc >= largest) {
    const [asked, most] = apart(Th - Tc, largest, 'K');
    return { kind: 'deltaT', text: `ΔT ${asked} is above its largest, ${most}` };
  }
  const I = form.currentForMostHeat(Tc, Th);
  return { kind: 'heat', text: `reaches ${brief(form.module.heat(I, Tc, Th), 'W')} at ${brief(I, 'A')}` };
}

function currentReasons(duty: Duty, { allowedCurrentA }: Candidate, { currentA }: WorkingPoint): MissReason[] {
  const reasons: MissReason[] = [];
  if (duty.maxCurrentA !== undefined && currentA > duty.maxCurrentA) {
    const [needs, limit] = apart(currentA, duty.maxCurrentA, 'A');
    reasons.push({ kind: 'current', text: `needs ${needs}, the limit is ${limit}` });
  }
  if (allowedCurrentA !== null && currentA > allowedCurrentA) {
    const [needs, limit] = apart(currentA, allowedCurrentA, 'A');
    reasons.push({ kind: 'allowedCurrent', text: `needs ${needs}, its sheet allows ${limit}` });
  }
  return reasons;
}

/** What a module that pumps the heat runs into: limits of the supply and of its own sheet; none when it does the duty. */
export function whyNot(duty: Duty, candidate: Candidate, point: WorkingPoint): MissReason[] {
  if (point.currentA < 0) return [];
  const reasons = currentReasons(duty, candidate, point);
  const volts = Math.abs(point.voltageV);
  if (duty.maxVoltageV !== undefined && volts > duty.maxVoltageV) {
    const [needs, limit] = apart(volts, duty.maxVoltageV, 'V');
    reasons.push({ kind: 'voltage', text: `needs ${needs}, the limit is ${limit}` });
  }
  return reasons;
}

/** A face above the highest temperature that the sheet states. */
export function tooHot({ coldFaceC, hotFaceC }: Duty, { maxTemperatureC }: Candidate): MissReason[] {
  const hottest = Math.max(coldFaceC, hotFaceC);
  if (maxTemperatureC === null || hottest <= maxTemperatureC) return [];
  const [asked, limit] = apart(hottest, maxTemperatureC, 'C');
  return [{ kind: 'temperature', text: `its sheet allows ${limit}, the duty has ${asked}` }];
}

/** More heat flows without any current than is to be pumped. */
export const flowsAnyhow = ({ form, Tc, Th }: State): MissReason => ({
  kind: 'flowsAnyhow',
  text: `lets ${brief(form.module.heat(0, Tc, Th), 'W')} through without any current`,
});
