import type { Chapter } from '../../../shared/domain/chapters/chapter';
import { TapeStrip } from '../../components/TapeStrip';

/** The chapters as tape over the seek bar; the list beside it says the same in words. */
export function ChapterTape({ chapters, durationMs }: { chapters: readonly Chapter[]; durationMs: number }) {
  if (durationMs <= 0) return null;
  const share = (ms: number) => `${(ms / durationMs) * 100}%`;
  return (
    <div aria-hidden="true" className="relative h-3.5 overflow-hidden">
      {chapters.map(({ id, kind, startMs, endMs }) => (
        <TapeStrip
          key={id}
          kind={kind}
          className="absolute! top-0"
          style={{ left: share(startMs), width: `calc(${share(Math.max(0, endMs - startMs))} - 1px)` }}
        />
      ))}
    </div>
  );
}
