import type { Unit } from '@/lib/units';
import type { Layer, Made, Panel, Picture } from '../draw/plan';
import type { Style } from '../draw/style';

const STEPS = [1, 1.2, 1.5, 1.6, 1.8, 2, 2.5, 3, 3.5, 4, 4.5, 5, 6, 7, 8, 9];

/** Round currents in equal steps, the last at or just below the current of the largest difference. */
export function currents({ truth }: Made, hotSideC: number, count: number, unit: Unit = 'A'): readonly number[] {
  const most = truth.ratings(hotSideC).imaxLargestDeltaT * (unit === 'mA' ? 1000 : 1) * 1.03;
  const power = 10 ** Math.floor(Math.log10(most / count));
  const step = (STEPS.findLast((each) => each * power * count <= most) ?? 1) * power;
  return Array.from({ length: count }, (_, at) => Number((step * (at + 1)).toPrecision(4)));
}

/** How a vendor writes a chart down. */
export interface Manner {
  readonly count: number;
  readonly deltaT: 'K' | 'C';
  readonly heat?: Unit;
  readonly current?: Unit;
  readonly style?: Style;
}

const familyOfCurrents = (made: Made, side: number, { count, current = 'A' }: Manner) => ({
  hotSideC: side,
  family: 'I' as const,
  familyUnit: current,
  values: currents(made, side, count, current),
});

export const heatLayer = (made: Made, side: number, manner: Manner): Layer => ({
  answer: 'Qc',
  unit: manner.heat ?? 'W',
  ...familyOfCurrents(made, side, manner),
});

export const voltageLayer = (made: Made, side: number, manner: Manner): Layer => ({
  answer: 'V',
  unit: 'V',
  ...familyOfCurrents(made, side, manner),
});

const against = (manner: Manner, title: string, layers: readonly Layer[]): Panel => ({ title, x: 'deltaT', xUnit: manner.deltaT, layers });

const single = (name: string, panel: Panel, style?: Style): Picture => ({
  name,
  title: panel.title,
  panels: [panel],
  ...(style && { style }),
});

/** Heat pumped against temperature difference at one hot side. */
export const heat = (made: Made, side: number, manner: Manner): Picture =>
  single(`heat-${side}`, against(manner, `Heat pumped at T_h = ${side} °C`, [heatLayer(made, side, manner)]), manner.style);

/** Voltage against temperature difference at one hot side. */
export const voltage = (made: Made, side: number, manner: Manner): Picture =>
  single(`voltage-${side}`, against(manner, `Voltage at T_h = ${side} °C`, [voltageLayer(made, side, manner)]), manner.style);

/** COP against temperature difference at one hot side. */
export const cop = (made: Made, side: number, manner: Manner, scale: 'linear' | 'log' = 'linear'): Picture =>
  single(
    `cop-${side}`,
    against(manner, `COP at T_h = ${side} °C`, [{ answer: 'COP', unit: '1', scale, ...familyOfCurrents(made, side, manner) }]),
    manner.style,
  );

/** Heat on the left axis and voltage on the right one, in one picture. */
export const heatAndVoltage = (made: Made, side: number, manner: Manner): Picture => {
  const layers = [heatLayer(made, side, manner), { ...voltageLayer(made, side, manner), side: 'right' as const, ink: 1 }];
  return single(`performance-${side}`, against(manner, `Performance at T_h = ${side} °C`, layers), manner.style);
};

/** Heat at two hot sides in one pair of axes, the second in the second ink. */
export const heatAtBoth = (made: Made, sides: readonly [number, number], manner: Manner): Picture => {
  const layers = sides.map((side, ink) => ({ ...heatLayer(made, side, manner), ink }));
  return single('heat', against(manner, `Heat pumped, T_h = ${sides[0]} °C (blue) and ${sides[1]} °C (red)`, layers), manner.style);
};

/** Two panels on one page: heat above, voltage below. */
export const heatOverVoltage = (made: Made, side: number, manner: Manner): Picture => ({
  name: `page-${side}`,
  title: `Heat pumped and voltage at T_h = ${side} °C`,
  panels: [...heat(made, side, manner).panels, ...voltage(made, side, manner).panels],
  ...(manner.style && { style: manner.style }),
});

const family = (side: number, deltaT: 'K' | 'C', values: readonly number[]) => ({
  hotSideC: side,
  family: 'deltaT' as const,
  familyUnit: deltaT,
  values,
});

/** An answer against current, for some temperature differences. */
export const againstCurrent = (answer: Layer['answer'], side: number, values: readonly number[], manner: Manner): Picture => {
  const [name, words] = { Qc: ['heat', 'Heat pumped'], V: ['voltage', 'Voltage'], COP: ['cop', 'COP'] }[answer] as [string, string];
  const layer: Layer = {
    answer,
    unit: answer === 'COP' ? '1' : answer === 'V' ? 'V' : (manner.heat ?? 'W'),
    ...family(side, manner.deltaT, values),
  };
  const panel = { title: `${words} at T_h = ${side} °C`, x: 'I' as const, xUnit: manner.current ?? 'A', layers: [layer] };
  return single(`${name}-current-${side}`, panel, manner.style);
};

/** Heat against the temperature of the cold side. */
export const heatAgainstCold = (made: Made, side: number, manner: Manner): Picture =>
  single(
    `heat-cold-${side}`,
    { title: `Heat pumped at T_h = ${side} °C`, x: 'Tc', xUnit: 'C', layers: [heatLayer(made, side, manner)] },
    manner.style,
  );

/** Heat as a share of Qmax for currents as shares of Imax. */
export const heatInShares = (side: number, manner: Manner): Picture => {
  const layer: Layer = {
    answer: 'Qc',
    unit: '%',
    yOf: 'qmaxW',
    hotSideC: side,
    family: 'I',
    familyUnit: '%',
    familyOf: 'imaxA',
    values: [20, 40, 60, 80, 100],
  };
  return single(
    `heat-share-${side}`,
    against(manner, `Heat pumped at T_h = ${side} °C, curves for I in % of I_max`, [layer]),
    manner.style,
  );
};
