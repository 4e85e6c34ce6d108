import { useId } from 'react';

export interface ProgressProps {
  label: string;
  /** 0 to 1, or null while it cannot be told. */
  value: number | null;
  /** What is shown at the right, such as "3.1 of 8.0 MB"; the share in percent when absent. */
  detail?: string;
}

export function Progress({ label, value, detail }: ProgressProps) {
  const id = useId();
  const percent = value === null ? null : Math.round(Math.min(1, Math.max(0, value)) * 100);
  return (
    <div className="progress">
      <span id={id}>{label}</span>
      <span className="muted">{detail ?? (percent === null ? '' : `${percent}\u00A0%`)}</span>
      <div
        className="progress-track"
        role="progressbar"
        aria-labelledby={id}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={percent ?? undefined}
      >
        <div
          className={percent === null ? 'progress-fill progress-unknown' : 'progress-fill'}
          style={percent === null ? undefined : { width: `${percent}%` }}
        />
      </div>
    </div>
  );
}
