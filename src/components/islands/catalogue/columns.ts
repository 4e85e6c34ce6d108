import type { CatalogueSort } from '@/lib/contracts';
import type { SortDirection } from '@/components/ui/sort';

export interface Column {
  readonly key: CatalogueSort;
  readonly label: string;
  readonly numeric: boolean;
  /** Direction of the first press. */
  readonly first: SortDirection;
  /** Only where there is room: a narrow page tells it elsewhere. */
  readonly wide?: boolean;
}

const words = (key: CatalogueSort, label: string): Column => ({ key, label, numeric: false, first: 'ascending' });
const numbers = (key: CatalogueSort, label: string, first: SortDirection = 'descending'): Column => ({ key, label, numeric: true, first });

/** Columns of the catalogue that sort, in their order; what the model rests on comes last but one and does not. */
export const COLUMNS: readonly Column[] = [
  words('module', 'Module'),
  { ...words('vendor', 'Vendor'), wide: true },
  numbers('qmax', 'Qmax / W'),
  numbers('dtmax', 'ΔTmax / K'),
  numbers('imax', 'Imax / A'),
  numbers('vmax', 'Vmax / V'),
  numbers('stages', 'Stages', 'ascending'),
  numbers('couples', 'Couples', 'ascending'),
  numbers('side', 'Plates / mm', 'ascending'),
  numbers('height', 'Height / mm', 'ascending'),
];
export const APPROVED: Column = { key: 'approved', label: 'Approved', numeric: false, first: 'descending' };
