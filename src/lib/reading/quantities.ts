/** Every quantity an axis or a family may show, in the order of the reading document. */
export const QUANTITIES = ['I', 'V', 'deltaT', 'Tc', 'Th', 'Qc', 'Qh', 'P', 'COP'] as const;

/** Every unit an axis or a family may be in; which of them a quantity allows is `unitsOf` of the units room. */
export const UNITS = ['K', 'C', 'F', 'W', 'mW', 'V', 'mV', 'A', 'mA', '1', '%'] as const;

/** The printed ratings that an axis may be normalised by. */
export const RATING_KEYS = ['imaxA', 'vmaxV', 'qmaxW', 'dTmaxK'] as const;

/** Name of a printed rating: Imax in A, Vmax in V, Qmax in W, ΔTmax in K. */
export type RatingKey = (typeof RATING_KEYS)[number];
