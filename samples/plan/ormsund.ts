import type { ModulePlan, VendorPlan } from '../draw/plan';
import { heat, voltage, type Manner } from './charts';
import { colourLines } from './styles';

const five: Manner = { count: 5, deltaT: 'K' };
const four: Manner = { count: 4, deltaT: 'K' };

const rated = { imaxMeans: 'largestDeltaT', basis: 'typical', atmosphere: 'dryNitrogen', tolerancePercent: 10 } as const;

const bothSides: ModulePlan['pictures'] = (made) => [heat(made, 27, five), heat(made, 50, five), voltage(made, 27, five)];
const oneSide: ModulePlan['pictures'] = (made) => [heat(made, 27, four), voltage(made, 27, four)];

export const ormsund: VendorPlan = {
  name: 'Ormsund Cold',
  series: 'villages',
  sheets: [
    {
      slug: 'oc-118',
      style: colourLines,
      body: {
        vendor: 'Ormsund Cold',
        title: 'Brimstead coolers, 40 mm',
        number: 'OC-118',
        revision: 'B',
        dated: '2024-02-19',
        obtainedFrom: 'ormsund.example, page of the Brimstead series',
        obtainedOn: '2025-09-03',
      },
      modules: [
        {
          partNumber: 'Brimstead 40-C',
          couples: 127,
          legMm: [1.15, 1.92],
          plateMm: [40, 40],
          heightMm: 3.6,
          aimK: 67,
          maxTemperatureC: 120,
          leadsOhm: 0.012,
          acResistanceAtC: 25,
          ratedAt: [27, 50],
          rated,
          // The table prints a current that the curves contradict.
          fault: { imaxA: 0.87 },
          pictures: bothSides,
        },
        {
          partNumber: 'Brimstead 40-D',
          couples: 127,
          legMm: [1.2, 1.35],
          plateMm: [40, 40],
          heightMm: 3.2,
          aimK: 68,
          maxTemperatureC: 120,
          leadsOhm: 0.012,
          acResistanceAtC: 25,
          ratedAt: [27, 50],
          rated,
          pictures: bothSides,
        },
        {
          partNumber: 'Brimstead 40-F',
          couples: 127,
          legMm: [1.4, 1.1],
          plateMm: [40, 40],
          heightMm: 3,
          aimK: 66,
          maxTemperatureC: 120,
          leadsOhm: 0.008,
          acResistanceAtC: 25,
          ratedAt: [27, 50],
          rated,
          pictures: bothSides,
        },
      ],
    },
    {
      slug: 'oc-104',
      style: colourLines,
      body: {
        vendor: 'Ormsund Cold',
        title: 'Aldermere coolers, 30 mm',
        number: 'OC-104',
        revision: 'D',
        dated: '2023-06-05',
        obtainedFrom: 'ormsund.example, page of the Aldermere series',
        obtainedOn: '2025-09-03',
      },
      modules: [
        {
          partNumber: 'Aldermere 30',
          variant: 'tall',
          couples: 127,
          legMm: [1, 1.6],
          plateMm: [30, 30],
          hotPlateMm: [30, 34],
          heightMm: 3.7,
          aimK: 69,
          maxTemperatureC: 80,
          sealing: 'epoxy',
          ratedAt: [27],
          rated,
          pictures: oneSide,
        },
        {
          partNumber: 'Aldermere 30',
          variant: 'low',
          couples: 127,
          legMm: [1, 1],
          plateMm: [30, 30],
          hotPlateMm: [30, 34],
          heightMm: 3.1,
          aimK: 66,
          maxTemperatureC: 80,
          sealing: 'epoxy',
          ratedAt: [27],
          rated,
          pictures: oneSide,
        },
      ],
    },
    {
      slug: 'oc-131',
      style: { ...colourLines, width: 1100, height: 760, finish: { file: 'png', colours: 128 } },
      body: {
        vendor: 'Ormsund Cold',
        title: 'Coldwick 62, large plate',
        number: 'OC-131',
        revision: '',
        dated: '2025-01-20',
        obtainedFrom: 'by mail from the maker',
        obtainedOn: '2025-10-14',
      },
      modules: [
        {
          partNumber: 'Coldwick 62',
          couples: 254,
          legMm: [1.4, 1.5],
          plateMm: [62, 62],
          heightMm: 4.3,
          aimK: 68,
          maxTemperatureC: 120,
          ratedAt: [27, 50],
          rated: { ...rated, tolerancePercent: 8 },
          pictures: bothSides,
        },
      ],
    },
  ],
};
