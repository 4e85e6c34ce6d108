import type { ModulePlan, VendorPlan } from '../draw/plan';
import { heatAtBoth, voltage, type Manner } from './charts';
import { twoInks } from './styles';

const manner: Manner = { count: 4, deltaT: 'K' };

/** Thistlecap guarantees least values of heat and temperature difference. */
const rated = { imaxMeans: 'largestDeltaT', basis: 'minimum', atmosphere: 'air' } as const;

const pictures: ModulePlan['pictures'] = (made) => [heatAtBoth(made, [27, 50], manner), voltage(made, 27, manner)];

const haff = { maxTemperatureC: 138, sealing: 'silicone', ratedAt: [27, 50], rated, pictures } as const;

export const thistlecap: VendorPlan = {
  name: 'Thistlecap',
  series: 'still waters',
  sheets: [
    {
      slug: 'thistlecap-haff',
      style: twoInks,
      body: {
        vendor: 'Thistlecap',
        title: 'Haff range',
        number: 'TC 14',
        revision: 'ii',
        dated: '2023-10-16',
        obtainedFrom: 'thistlecap.example, catalogue, pages 8 to 13',
        obtainedOn: '2025-09-29',
      },
      modules: [
        { ...haff, partNumber: 'Haff 30', couples: 71, legMm: [1.4, 1.4], plateMm: [30, 30], heightMm: 3.8, aimK: 67 },
        // A Qmax that no material with this voltage, current and difference could pump.
        {
          ...haff,
          partNumber: 'Haff 40',
          couples: 127,
          legMm: [1.4, 1.15],
          plateMm: [40, 40],
          heightMm: 3.4,
          aimK: 66,
          fault: { qmaxW: 1.27 },
        },
        { ...haff, partNumber: 'Haff 50', couples: 199, legMm: [1.4, 1.3], plateMm: [50, 50], heightMm: 3.7, aimK: 68 },
      ],
    },
    {
      slug: 'thistlecap-mere',
      style: { ...twoInks, width: 1040, height: 760, margin: { left: 92, right: 36, top: 54, bottom: 84 } },
      body: {
        vendor: 'Thistlecap',
        title: 'Tarn, Voe and Mere',
        number: 'TC 17',
        revision: 'i',
        dated: '2024-05-27',
        obtainedFrom: 'thistlecap.example, catalogue, pages 20 to 25',
        obtainedOn: '2025-09-29',
      },
      modules: [
        { ...haff, partNumber: 'Tarn 20', couples: 31, legMm: [1.4, 1.6], plateMm: [20, 20], heightMm: 4, aimK: 69, leadsOhm: 0.01 },
        {
          ...haff,
          partNumber: 'Voe 23',
          couples: 63,
          legMm: [1, 1.9],
          plateMm: [23, 23],
          heightMm: 4.2,
          aimK: 70,
          leftOut: ['hotPlateMm'],
        },
        { ...haff, partNumber: 'Mere 55', couples: 241, legMm: [1.4, 1.6], plateMm: [55, 55], heightMm: 4.2, aimK: 68, sealing: undefined },
      ],
    },
  ],
};
