import type { VendorPlan } from '../draw/plan';
import { againstCurrent, cop, heat, heatInShares, voltage, type Manner } from './charts';
import { colourLines, officeChart } from './styles';

const manner: Manner = { count: 5, deltaT: 'K' };
const four: Manner = { count: 4, deltaT: 'K' };
const milliamperes: Manner = { ...four, heat: 'mW', current: 'mA' };

const fineGrid = { ...colourLines.grid, fine: { ink: '#ececec', width: 1 } };

const measured = { basis: 'measured', atmosphere: 'dryNitrogen', imaxMeans: 'largestDeltaT', tolerancePercent: 7 } as const;

export const pellamy: VendorPlan = {
  name: 'Pellamy Rook',
  series: 'old dances',
  sheets: [
    {
      slug: 'pellamy-rook-measured',
      style: officeChart,
      body: {
        vendor: 'Pellamy Rook',
        title: 'Pavane and Gavotte, measured',
        number: 'PR-M-2',
        revision: 'a',
        dated: '2025-03-11',
        obtainedFrom: 'pellamy-rook.example/measured',
        obtainedOn: '2025-11-05',
      },
      modules: [
        {
          partNumber: 'Pavane',
          couples: 127,
          legMm: [1.3, 1.4],
          plateMm: [40, 40],
          heightMm: 3.8,
          aimK: 72,
          maxTemperatureC: 150,
          leadsOhm: 0.009,
          acResistanceAtC: 27,
          ratedAt: [27],
          rated: measured,
          pictures: (made) => [
            heat(made, 27, manner),
            againstCurrent('V', 27, [0, 20, 40, 60], manner),
            againstCurrent('COP', 27, [10, 20, 30, 40], manner),
          ],
        },
        {
          partNumber: 'Gavotte',
          couples: 71,
          legMm: [1, 1.2],
          plateMm: [23, 23],
          heightMm: 3.2,
          aimK: 74,
          maxTemperatureC: 150,
          ratedAt: [27],
          rated: measured,
          pictures: (made) => [heat(made, 27, four), voltage(made, 27, four), cop(made, 27, four)],
        },
      ],
    },
    {
      slug: 'pellamy-rook-small',
      style: officeChart,
      body: {
        vendor: 'Pellamy Rook',
        title: 'Musette, Courante, Rigaudon',
        number: 'PR-S-1',
        revision: 'c',
        dated: '2024-12-02',
        obtainedFrom: 'pellamy-rook.example/small',
        obtainedOn: '2025-11-05',
      },
      modules: [
        {
          partNumber: 'Musette',
          couples: 7,
          legMm: [1.5, 1.1],
          plateMm: [10, 10],
          heightMm: 2.9,
          aimK: 65,
          maxTemperatureC: 110,
          ratedAt: [27],
          pictures: (made) => [againstCurrent('Qc', 27, [0, 15, 30, 45], four), voltage(made, 27, four)],
        },
        {
          partNumber: 'Courante',
          couples: 18,
          legMm: [0.7, 1.2],
          plateMm: [8, 12],
          heightMm: 2.7,
          aimK: 69,
          maxTemperatureC: 110,
          leftOut: ['couples'],
          ratedAt: [27],
          unrated: ['vmaxV'],
          pictures: (made) => [heat(made, 27, four), voltage(made, 27, four)],
        },
        {
          partNumber: 'Rigaudon',
          couples: 31,
          legMm: [0.45, 1.23],
          plateMm: [14, 14],
          heightMm: 2.5,
          aimK: 71,
          maxTemperatureC: 110,
          ratedAt: [27],
          pictures: (made) => [heat(made, 27, milliamperes), voltage(made, 27, milliamperes)],
        },
      ],
    },
    {
      slug: 'pellamy-rook-sarabande',
      style: { ...colourLines, width: 860, height: 640, labels: 'legend', grid: fineGrid, parts: 2, finish: { file: 'png', colours: 64 } },
      body: {
        vendor: 'Pellamy Rook',
        title: 'Sarabande',
        number: 'PR-L-1',
        revision: '',
        dated: '2025-06-23',
        obtainedFrom: '',
        obtainedOn: '',
      },
      modules: [
        {
          partNumber: 'Sarabande',
          couples: 127,
          legMm: [1.8, 1.2],
          plateMm: [55, 55],
          heightMm: 3.6,
          aimK: 66,
          maxTemperatureC: 150,
          ratedAt: [27],
          rated: { imaxMeans: 'allowed', tolerancePercent: 10 },
          // The current allowed is less than the current of the largest difference.
          fault: { imaxA: 0.9 },
          pictures: (made) => [heatInShares(27, manner), voltage(made, 27, manner), cop(made, 27, four, 'log')],
        },
      ],
    },
  ],
};
