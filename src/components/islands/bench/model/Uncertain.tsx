import { formatUncertain } from '@/lib/units';

/** A value with its standard uncertainty: the short form for the eye, the long one for the ear. */
export function Uncertain({ value, u, unit }: { value: number | null | undefined; u: number | null | undefined; unit: string }) {
  const { text, spoken } = formatUncertain(value, u, unit);
  if (text === spoken) return <>{text}</>;
  return (
    <>
      <span aria-hidden="true">{text}</span>
      <span className="sr-only">{spoken}</span>
    </>
  );
}
