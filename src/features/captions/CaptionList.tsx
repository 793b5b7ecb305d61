import { defaultRangeExtractor, useVirtualizer } from '@tanstack/react-virtual';
import { useEffect, useRef } from 'react';
import type { PictureShape, ReadingProfile } from '../../../shared/domain/captions/readingProfile';
import { type Playhead, useAtPlayhead } from '../../lib/playhead';
import type { Lines } from './api';
import { CaptionRow } from './CaptionRow';
import { type LineFault, lineAt, lineFaults } from './lineFaults';
import type { LineEdits } from './useLineEdits';

type Props = {
  lines: Lines;
  edits: LineEdits;
  playhead: Playhead;
  profile: ReadingProfile;
  picture: PictureShape;
  places: ReadonlyMap<number, LineFault[]>;
  /** whether the list goes along with the picture */
  follow: 'on' | 'off';
};

/** Of a row with one row of text, px; the real heights are measured. */
const rowPx = 47;

/** All lines of a recording; only those in view are drawn, so that 6,000 are as quick as 60. */
export function CaptionList({ lines, edits, playhead, profile, picture, places, follow }: Props) {
  const box = useRef<HTMLElement>(null);
  const said = useAtPlayhead(playhead, (ms) => lineAt(lines, ms));
  const { at } = edits;
  const rows = useVirtualizer({
    count: lines.length,
    getScrollElement: () => box.current,
    estimateSize: () => rowPx,
    overscan: 6,
    // the line that one writes in stays, wherever the list is scrolled: its field has the focus
    rangeExtractor: (range) => {
      const shown = defaultRangeExtractor(range);
      return at === null || at >= lines.length || shown.includes(at) ? shown : [...shown, at].toSorted((a, b) => a - b);
    },
  });

  useEffect(() => {
    if (follow === 'off' || said < 0) return;
    // nobody's line runs away while they write in it
    if (box.current?.contains(document.activeElement) && document.activeElement?.matches('textarea, input')) return;
    rows.scrollToIndex(said, { align: 'center' });
  }, [said, follow, rows]);
  useEffect(() => {
    if (at !== null) rows.scrollToIndex(at, { align: 'auto' });
  }, [at, rows]);

  return (
    <section
      ref={box}
      className="max-h-[min(70dvh,48rem)] overflow-y-auto overflow-x-hidden min-[56.25rem]:h-[calc(100dvh-13rem)] min-[56.25rem]:max-h-none min-[56.25rem]:min-h-100"
      // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls is reached by the keyboard
      tabIndex={0}
      aria-label="Caption lines"
    >
      <ol className="@container relative" style={{ height: rows.getTotalSize() }}>
        {rows.getVirtualItems().map(({ index, start }) => {
          const line = lines[index];
          if (!line) return null;
          return (
            <li
              key={index}
              ref={rows.measureElement}
              data-index={index}
              aria-setsize={lines.length}
              aria-posinset={index + 1}
              className="absolute inset-x-0 top-0"
              style={{ transform: `translateY(${start}px)` }}
            >
              <CaptionRow
                line={line}
                index={index}
                state={index === at ? 'open' : 'closed'}
                said={index === said}
                last={index === lines.length - 1}
                faults={[...lineFaults(line, profile, picture), ...(places.get(index) ?? [])]}
                edits={edits}
                playhead={playhead}
              />
            </li>
          );
        })}
      </ol>
    </section>
  );
}
