import type { ModulePlan, SheetPlan, VendorPlan } from '../draw/plan';
import { heatOverVoltage, type Manner } from './charts';
import { scannedPage } from './styles';

const manner: Manner = { count: 5, deltaT: 'C' };

/** Dunmarrow means the current of most heat when it says Imax. */
const rated = { imaxMeans: 'mostHeat', basis: 'calculated' } as const;

const pictures: ModulePlan['pictures'] = (made) => [heatOverVoltage(made, made.plan.ratedAt[0] ?? 30, manner)];

const sheet = (
  slug: string,
  turnDegrees: number,
  body: Omit<SheetPlan['body'], 'vendor' | 'obtainedFrom' | 'obtainedOn'>,
  modules: readonly ModulePlan[],
): SheetPlan => ({
  slug,
  style: { ...scannedPage, turnDegrees },
  body: { vendor: 'Dunmarrow Works', obtainedFrom: 'printed leaflet, scanned at our desk', obtainedOn: '2025-07-02', ...body },
  modules,
});

const wind = { rated, pictures, ratedAt: [30] } as const;

export const dunmarrow: VendorPlan = {
  name: 'Dunmarrow Works',
  series: 'winds',
  sheets: [
    sheet('dunmarrow-4', 0.8, { title: 'Bise and Helm', number: 'Leaflet 4', revision: '', dated: '2019-04-15' }, [
      {
        ...wind,
        partNumber: 'Bise',
        couples: 49,
        legMm: [1.2, 1.7],
        plateMm: [25, 25],
        heightMm: 4,
        aimK: 66,
        leftOut: ['couples', 'stages'],
      },
      { ...wind, partNumber: 'Helm', couples: 127, legMm: [1.2, 2], plateMm: [40, 40], heightMm: 4.4, aimK: 68, maxTemperatureC: 100 },
    ]),
    sheet('dunmarrow-6', -1.3, { title: 'Ostro and Zonda', number: 'Leaflet 6', revision: '', dated: '2020-02-10' }, [
      { ...wind, partNumber: 'Ostro', couples: 17, legMm: [0.9, 1.3], plateMm: [12, 12], heightMm: 3, aimK: 65, leftOut: ['heightMm'] },
      { ...wind, partNumber: 'Zonda', couples: 35, legMm: [1.4, 1.4], plateMm: [30, 15], heightMm: 3.6, aimK: 64, maxTemperatureC: 100 },
    ]),
    sheet('dunmarrow-9', 0.5, { title: 'Levanter and Etesian', number: 'Leaflet 9', revision: '2nd printing', dated: '' }, [
      {
        ...wind,
        partNumber: 'Levanter',
        couples: 127,
        legMm: [1.8, 1.5],
        plateMm: [48, 48],
        heightMm: 4.1,
        aimK: 62,
        maxTemperatureC: 100,
      },
      {
        ...wind,
        partNumber: 'Etesian',
        couples: 254,
        legMm: [0.9, 1.2],
        plateMm: [40, 40],
        heightMm: 3.2,
        aimK: 65,
        leftOut: ['couples'],
        acResistanceAtC: 20,
      },
    ]),
  ],
};
