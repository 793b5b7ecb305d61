import { clsx } from 'clsx';

/** One grey line or box where something will be. Size it by classes. */
export function Skeleton({ className }: { className?: string }) {
  return <span aria-hidden="true" className={clsx('skeleton block', className)} />;
}

const widths = ['w-3/5', 'w-2/5', 'w-1/2', 'w-2/3'];

/**
 * Rows as they will be, shown when the wait lasts over 300 ms.
 * @param label what is awaited: “Sessions”; read out once
 */
export function SkeletonRows({
  label,
  count = 4,
  still = 'none',
}: {
  label: string;
  count?: number;
  still?: 'none' | 'small' | 'large';
}) {
  return (
    <div role="status" className="shown-late">
      <span className="sr-only">{label}: on the way</span>
      {Array.from({ length: count }, (_, row) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: the rows are all alike and never move
        <div key={row} className="flex items-start gap-3 border-b border-line py-2.5">
          {still !== 'none' && (
            <Skeleton className={clsx('aspect-video flex-none', still === 'small' ? 'w-23' : 'w-37')} />
          )}
          <div className="grow py-1">
            <Skeleton className={clsx('h-4', widths[row % widths.length])} />
            <Skeleton className="mt-2 h-3 w-1/4" />
          </div>
          <Skeleton className="mt-1 h-4 w-8" />
        </div>
      ))}
    </div>
  );
}
