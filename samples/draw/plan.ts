import type { ModuleBody, Rating, SheetBody } from '@/lib/contracts';
import type { RatingKey } from '@/lib/reading';
import type { Unit } from '@/lib/units';
import type { Style } from './style';
import type { Truth } from './truth';

export type XQuantity = 'deltaT' | 'I' | 'Tc';

/** One family of curves in a panel: what is answered, at which hot side, for which values of the family. */
export interface Layer {
  readonly answer: 'Qc' | 'V' | 'COP';
  readonly hotSideC: number;
  readonly family: 'I' | 'deltaT';
  readonly familyUnit: Unit;
  /** A share of this printed rating stands in for the value itself, on the y axis or in the family. */
  readonly yOf?: RatingKey;
  readonly familyOf?: RatingKey;
  /** In the family's unit, smallest first. */
  readonly values: readonly number[];
  readonly unit: Unit;
  readonly scale?: 'linear' | 'log';
  readonly side?: 'left' | 'right';
  /** Which of the style's inks, where a panel tells two families apart. */
  readonly ink?: number;
}

/** One pair of axes, or three axes where a layer stands on the right. */
export interface Panel {
  readonly title: string;
  readonly x: XQuantity;
  readonly xUnit: Unit;
  readonly layers: readonly Layer[];
}

/** One page of a sheet: one picture file. */
export interface Picture {
  /** Ends the file name, after the module's. */
  readonly name: string;
  readonly title: string;
  readonly panels: readonly Panel[];
  readonly style?: Style;
}

type Identity = Omit<ModuleBody, 'vendor' | 'ratings'>;

/** A module as we made it up: what it is made of, what its sheet says, what it leaves out. */
export interface ModulePlan extends Pick<Identity, 'partNumber'> {
  readonly variant?: string;
  readonly couples: number;
  /** Side and height of a leg, mm. */
  readonly legMm: readonly [number, number];
  readonly plateMm: readonly [number, number];
  readonly hotPlateMm?: readonly [number, number];
  readonly heightMm: number;
  /** ΔTmax that the material is good for, at the sheet's first hot side. */
  readonly aimK: number;
  readonly maxTemperatureC?: number;
  readonly leadsOhm?: number;
  readonly sealing?: string;
  /** Where the sheet gives a resistance measured with alternating current, °C. */
  readonly acResistanceAtC?: number;
  readonly leftOut?: readonly ('couples' | 'heightMm' | 'hotPlateMm' | 'stages')[];
  readonly ratedAt: readonly number[];
  readonly rated?: Partial<Pick<Rating, 'imaxMeans' | 'basis' | 'atmosphere' | 'tolerancePercent'>>;
  /** Ratings that the sheet does not print. */
  readonly unrated?: readonly RatingKey[];
  /** A deliberate fault of the sheet: printed rating over true rating. */
  readonly fault?: Partial<Record<RatingKey, number>>;
  readonly pictures: (made: Made) => readonly Picture[];
}

/** A module with its truth and what its sheet prints. */
export interface Made {
  readonly slug: string;
  readonly plan: ModulePlan;
  readonly truth: Truth;
  readonly body: ModuleBody;
}

export interface SheetPlan {
  readonly slug: string;
  readonly body: SheetBody;
  readonly style: Style;
  readonly modules: readonly ModulePlan[];
}

export interface VendorPlan {
  readonly name: string;
  /** What the maker names its modules after. */
  readonly series: string;
  readonly sheets: readonly SheetPlan[];
}
