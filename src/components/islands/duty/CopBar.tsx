/** A COP as a bar beside its number, as a share of the best in the table; all of the bar where no power is taken up. */
export function CopBar({ share }: { share: number }) {
  return (
    <span className="meter" aria-hidden="true">
      <i style={{ width: `${Math.round(Math.max(0, Math.min(1, share)) * 1000) / 10}%` }} />
    </span>
  );
}
