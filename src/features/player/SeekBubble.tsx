import { clsx } from 'clsx';
import type { Watch } from '../../../shared/contracts/watch';
import { formatMs } from '../../../shared/domain/timecode';
import { Still } from '../../components/Still';

type Props = { atMs: number; durationMs: number; chapter: Watch['chapters'][number] | undefined };

/** What lies at a place of the bar: the chapter's picture, its name, the time. The slider says the same to screen readers. */
export function SeekBubble({ atMs, durationMs, chapter }: Props) {
  const share = durationMs > 0 ? atMs / durationMs : 0;
  return (
    // anchored by the share itself, so that it never leaves the bar at either end
    <div
      className={clsx('seek-bubble', chapter?.pictureUrl && 'w-43!')}
      aria-hidden="true"
      style={{ left: `${100 * share}%`, translate: `${-100 * share}% 0` }}
    >
      {chapter?.pictureUrl && <Still src={chapter.pictureUrl} loading="eager" className="w-full rounded-none!" />}
      <div className="flex items-baseline gap-2 px-2.5 py-1 text-sm">
        <span className="font-extrabold">{formatMs(atMs)}</span>
        {chapter && <span className="min-w-0 truncate">{chapter.title}</span>}
      </div>
    </div>
  );
}
