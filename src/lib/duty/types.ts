import type { ModelForm } from '@/lib/module';
import type { Validity } from '@/lib/reading';

/** What a module must do: the heat to pump between two face temperatures, within what the supply gives. */
export interface Duty {
  /** Heat to pump, W, positive. */
  readonly heatW: number;
  /** Faces of the module, °C; load and sink lie beyond them. */
  readonly coldFaceC: number;
  readonly hotFaceC: number;
  /** Most current and voltage of the supply, A and V; no limit when left out. */
  readonly maxCurrentA?: number | undefined;
  readonly maxVoltageV?: number | undefined;
  /** Air around the cold face, °C and % relative humidity over water: for the dew point, never for the search. */
  readonly ambientC?: number | undefined;
  readonly humidityPercent?: number | undefined;
}

/** An approved model as the search needs it. */
export interface CandidateModel {
  readonly form: ModelForm;
  /** α in V/K, R in ohm, K in W/K: effective ones for the constant form, else those at 300.15 K. */
  readonly parameters: readonly [alpha: number, R: number, K: number];
  /** Covariance of the parameters, in their order. */
  readonly covariance: readonly (readonly number[])[];
  /** What the form leaves of heat (W) and voltage (V), root mean square over the sheet; null where no chart shows it. */
  readonly misfit: { readonly heatW: number | null; readonly voltageV: number | null };
  /** What a delivered module may differ from its sheet, half width in percent of its heat; null when not stated. */
  readonly tolerancePercent: number | null;
  readonly validity: Validity;
}

/** One module to be held against a duty. Whatever else it carries comes back with its row. */
export interface Candidate {
  readonly model: CandidateModel;
  /** Highest temperature the sheet allows, °C; null when not stated. */
  readonly maxTemperatureC: number | null;
  /** Current the sheet allows, A, where it prints one as a permission; null when it does not. */
  readonly allowedCurrentA: number | null;
}

/** A value with how well the sheet was read (covariance and misfit of the form) and what a delivered module may differ. */
export interface DoubtfulValue {
  readonly value: number;
  /** Standard uncertainty of the reading; null where it has no finite one. */
  readonly u: number | null;
  /** What a module at the low end of its tolerance makes of it, as a distance; null when not stated or out of reach. */
  readonly tolerance: number | null;
}

/** How a module runs at a duty. */
export interface WorkingPoint {
  readonly currentA: number;
  readonly voltageV: number;
  readonly powerW: number;
  /** Heat pumped over power; null where no power is taken up or the module generates. */
  readonly cop: number | null;
  readonly heatRejectedW: number;
}

/** Heat that a module reaches, and the current that does it. */
export interface Reach {
  readonly heatW: number;
  readonly currentA: number;
}

export type NoteKind = 'current' | 'deltaT' | 'hotSide' | 'aboveImax' | 'maxTemperature' | 'lowEnd';

/** What to know about a match: where it leaves the sheet, what the sheet does not say. */
export interface DutyNote {
  readonly kind: NoteKind;
  readonly text: string;
}

/** A module that does the duty. */
export interface DutyMatch<C extends Candidate = Candidate> {
  readonly candidate: C;
  readonly current: DoubtfulValue;
  readonly voltageV: number;
  readonly powerW: number;
  /** Null where no power is taken up: better than any number. */
  readonly cop: DoubtfulValue | null;
  /** The wanted heat, with what it may turn out to be at this current. */
  readonly heat: DoubtfulValue;
  readonly heatRejectedW: number;
  /** Current over the current of the largest ΔT at this hot face, as a fraction. */
  readonly shareOfImax: number;
  /** Most heat within the limits less the wanted heat, W. */
  readonly reserveW: number;
  /** Inside the currents, ΔT and hot sides the sheet shows. */
  readonly inside: boolean;
  readonly notes: readonly DutyNote[];
}

/** Why a module does not do the duty; of several the first in this order is counted. */
export const MISS_KINDS = ['deltaT', 'heat', 'current', 'allowedCurrent', 'voltage', 'temperature', 'flowsAnyhow'] as const;
export type MissKind = (typeof MISS_KINDS)[number];

export interface MissReason {
  readonly kind: MissKind;
  /** "reaches 14.2 W at 3.1 A": with numbers, lower case, no full stop. */
  readonly text: string;
}

/** A module that does not do the duty. */
export interface DutyMiss<C extends Candidate = Candidate> {
  readonly candidate: C;
  /** At least one. */
  readonly reasons: readonly MissReason[];
  /** Most heat between these faces within the limits. */
  readonly reach: Reach;
  /** How far off, as a share of what is wanted: 0 is a hair's breadth. */
  readonly shortfall: number;
}

/** Every candidate once, as a match or as a miss. */
export interface DutyOutcome<C extends Candidate = Candidate> {
  /** Best COP first. */
  readonly matches: readonly DutyMatch<C>[];
  /** Closest first. */
  readonly misses: readonly DutyMiss<C>[];
  /** Misses by their first reason. */
  readonly missCounts: Readonly<Record<MissKind, number>>;
}
