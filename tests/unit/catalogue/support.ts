import type { CatalogueEntry } from '@/lib/server/catalogue';
import { haystackOf } from '@/lib/server/catalogue/words';
import { plainModel } from '../duty/support';

interface Changes {
  readonly id?: number;
  readonly vendor?: string;
  readonly partNumber?: string;
  readonly sheet?: string;
  readonly stages?: number | null;
  readonly couples?: number | null;
  readonly sideMm?: number | null;
  readonly qmaxW?: number;
}

const uncertain = (value: number, unit: string) => ({ value, u: value / 100, unit });

/** An entry of the catalogue as a reading of an invented sheet would make it. */
export function entry(changes: Changes = {}): CatalogueEntry {
  const { id = 1, vendor = 'Ormsund Cold', partNumber = 'Brimstead 40-C', sheet = 'OC-118', stages = 1, couples = 127 } = changes;
  const { sideMm = 40, qmaxW = 60 } = changes;
  const plate: [number, number] | null = sideMm === null ? null : [sideMm, sideMm - 2];
  return {
    row: {
      id,
      vendor: { id: vendor.length, name: vendor },
      partNumber,
      variant: '',
      stages,
      couples,
      coldPlateMm: plate,
      hotPlateMm: plate,
      heightMm: 3.6,
      grade: 'curves',
      imax: uncertain(6, 'A'),
      vmax: uncertain(16, 'V'),
      qmax: uncertain(qmaxW, 'W'),
      dtmax: uncertain(68, 'K'),
      approvedAt: null,
    },
    name: partNumber,
    haystack: haystackOf([vendor, partNumber, '', sheet]),
    sideMm,
    readingModel: {} as CatalogueEntry['readingModel'],
    model: plainModel,
    maxTemperatureC: null,
    allowedCurrentA: null,
  };
}
