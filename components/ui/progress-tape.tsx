interface Props {
  done: number;
  of: number;
  label: string;
}

/** Progress as a place on a tape. */
export function ProgressTape({ done, of, label }: Props) {
  const share = of === 0 ? 0 : Math.min(1, done / of);
  return (
    <div
      role="progressbar"
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={of}
      aria-valuenow={done}
      className="h-3 w-full overflow-hidden rounded-sm border border-line bg-tape-wash"
    >
      <div className="h-full bg-tape" style={{ width: `${share * 100}%` }} />
    </div>
  );
}
