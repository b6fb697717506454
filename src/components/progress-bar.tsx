/** How far some work has come, 0 to 1; null where that cannot be told. */
export function ProgressBar({ label, share }: { label: string; share: number | null }) {
  const percent = share === null ? undefined : Math.round(share * 100);
  return (
    <div>
      <div className="mb-1 flex justify-between text-sm text-ink-700">
        <span>{label}</span>
        {percent === undefined ? null : <span className="tabular-nums">{percent} %</span>}
      </div>
      <div role="progressbar" aria-label={label} aria-valuemin={0} aria-valuemax={100} aria-valuenow={percent} className="h-2 border border-ink-500 bg-white">
        <div className={percent === undefined ? 'h-full w-1/3 bg-chalk-600 motion-safe:animate-pulse' : 'h-full bg-chalk-600'} style={percent === undefined ? undefined : { width: `${percent}%` }} />
      </div>
    </div>
  );
}
