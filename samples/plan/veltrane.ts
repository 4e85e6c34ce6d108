import type { VendorPlan } from '../draw/plan';
import { heat, heatAgainstCold, heatAndVoltage, voltage, type Manner } from './charts';
import { blackInk, blackInkOverGrid } from './styles';

const ink: Manner = { count: 5, deltaT: 'C' };
const small: Manner = { count: 4, deltaT: 'C', style: blackInkOverGrid };
const milli: Manner = { ...small, heat: 'mW', current: 'A' };

/** The sheets of Veltrane do not say which current Imax means, nor what the numbers rest on. */
const rated = { tolerancePercent: 5 } as const;

export const veltrane: VendorPlan = {
  name: 'Veltrane',
  series: 'birds',
  sheets: [
    {
      slug: 'veltrane-small-birds',
      style: blackInk,
      body: {
        vendor: 'Veltrane',
        title: 'Small coolers for optics',
        number: '7/22',
        revision: '3',
        dated: '2022-11-08',
        obtainedFrom: 'veltrane.example/optics',
        obtainedOn: '2025-08-11',
      },
      modules: [
        {
          partNumber: 'Wren 8',
          couples: 7,
          legMm: [1, 1.5],
          plateMm: [8, 8],
          hotPlateMm: [8, 11],
          heightMm: 3.3,
          aimK: 70,
          maxTemperatureC: 85,
          ratedAt: [25],
          rated: { ...rated, atmosphere: 'vacuum' },
          pictures: (made) => [heatAndVoltage(made, 25, small)],
        },
        {
          partNumber: 'Siskin 8',
          couples: 17,
          legMm: [0.6, 1.2],
          plateMm: [8, 8],
          heightMm: 2.8,
          aimK: 71,
          maxTemperatureC: 85,
          ratedAt: [25],
          rated: { ...rated, atmosphere: 'vacuum' },
          pictures: (made) => [heatAndVoltage(made, 25, milli)],
        },
        {
          partNumber: 'Dunnock 15',
          couples: 31,
          legMm: [1, 1.6],
          plateMm: [15, 15],
          heightMm: 3.5,
          aimK: 70,
          maxTemperatureC: 85,
          ratedAt: [25],
          rated: { ...rated, atmosphere: 'vacuum' },
          unrated: ['vmaxV'],
          pictures: (made) => [heat(made, 25, ink), voltage(made, 25, ink)],
        },
      ],
    },
    {
      slug: 'veltrane-sel',
      style: blackInk,
      body: {
        vendor: 'Veltrane',
        title: 'Sel 30 L, long legs',
        number: '2/23',
        revision: '1',
        dated: '2023-03-02',
        obtainedFrom: 'veltrane.example/sel',
        obtainedOn: '2025-08-11',
      },
      modules: [
        {
          partNumber: 'Sel 30 L',
          couples: 71,
          legMm: [1.2, 2.1],
          plateMm: [30, 30],
          heightMm: 4.6,
          aimK: 72,
          maxTemperatureC: 90,
          leadsOhm: 0.02,
          leftOut: ['couples'],
          ratedAt: [25],
          rated,
          pictures: (made) => [heat(made, 25, ink), heat(made, 50, ink), voltage(made, 25, ink)],
        },
      ],
    },
    {
      slug: 'veltrane-large-birds',
      style: blackInk,
      body: {
        vendor: 'Veltrane',
        title: 'Large coolers',
        number: '9/24',
        revision: '2',
        dated: '2024-09-30',
        obtainedFrom: 'leaflet from a trade fair, drawn files asked for by mail',
        obtainedOn: '2025-11-20',
      },
      modules: [
        {
          partNumber: 'Lark 62',
          couples: 127,
          legMm: [2, 1.36],
          plateMm: [62, 62],
          heightMm: 4.1,
          aimK: 66,
          maxTemperatureC: 90,
          ratedAt: [25],
          rated: { tolerancePercent: 10 },
          pictures: (made) => [heat(made, 25, ink), voltage(made, 25, ink)],
        },
        {
          partNumber: 'Heron 50',
          couples: 127,
          legMm: [1.6, 1.25],
          plateMm: [50, 50],
          hotPlateMm: [50, 54],
          heightMm: 3.9,
          aimK: 77,
          maxTemperatureC: 90,
          leftOut: ['stages'],
          ratedAt: [50],
          rated: { tolerancePercent: 10 },
          pictures: (made) => [heatAgainstCold(made, 50, ink), voltage(made, 50, ink)],
        },
      ],
    },
  ],
};
