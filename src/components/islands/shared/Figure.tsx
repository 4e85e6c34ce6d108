import { formatNumber, formatUncertain, NOT_STATED, type FormatOptions } from '@/lib/units';

/** What nobody stated: an en dash for the eye, words for the ear. */
export const NotStated = () => (
  <>
    <span aria-hidden="true">{NOT_STATED}</span>
    <span className="sr-only">not stated</span>
  </>
);

/** A plain number of a table, its unit in the heading. */
export function Plain({ value, ...options }: { value: number | null } & FormatOptions) {
  return value === null ? <NotStated /> : <>{formatNumber(value, options)}</>;
}

/** A number with its standard uncertainty, "29.8(2)", its unit in the heading; said as "29.8 plus or minus 0.2". */
export function Uncertain({ value, u, unit = '1', digits = 3 }: { value: number; u: number | null; unit?: string; digits?: number }) {
  if (u === null || !(u > 0)) return <>{formatNumber(value, { digits })}</>;
  const { text, spoken } = formatUncertain(value, u, unit);
  return (
    <span className="figure">
      <span aria-hidden="true">{text}</span>
      <span className="sr-only">{spoken}</span>
    </span>
  );
}
