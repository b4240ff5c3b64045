/** How much of a file or a task is done; the words stand beside it. */
export function ProgressBar({ label, done, of }: { label: string; done: number; of: number }) {
  const percent = of > 0 ? Math.min(100, Math.max(0, (done / of) * 100)) : 0;
  return (
    <div
      role="progressbar"
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={100}
      aria-valuenow={Math.round(percent)}
      className="h-1.5 overflow-hidden rounded-2 bg-well"
    >
      <div className="h-full bg-action forced-color-adjust-none" style={{ width: `${percent}%` }} />
    </div>
  );
}
