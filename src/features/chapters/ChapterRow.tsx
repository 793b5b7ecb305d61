import { clsx } from 'clsx';
import { type ReactNode, useEffect, useRef } from 'react';
import type { KitItem } from '../../../shared/contracts/kit';
import type { Chapter } from '../../../shared/domain/chapters/chapter';
import { formatMs, formatMsWithTenths } from '../../../shared/domain/timecode';
import { Icon } from '../../components/Icon';
import { keepKeys } from '../../components/keepKeys';
import { TapeStrip } from '../../components/TapeStrip';
import { kindNames, type Names } from './chapterNames';
import type { RowFault } from './rowFaults';

/** Start, length, tape, what it shows, block; without room for it the block goes below the title. */
export const rowColumns =
  'grid grid-cols-[4rem_2.5rem_2.5rem_minmax(0,1fr)] items-start gap-x-3 @md:grid-cols-[4.25rem_3rem_2.5rem_minmax(0,1.5fr)_minmax(0,1fr)]';

type Props = {
  chapter: Chapter;
  state: 'open' | 'closed';
  playing: boolean;
  faults: readonly RowFault[];
  names: Names;
  kit: readonly KitItem[];
  /** the block's name, or nothing */
  block: string;
  onSelect: () => void;
  children: ReactNode;
};

export function ChapterRow({ chapter, state, playing, faults, names, kit, block, onSelect, children }: Props) {
  const row = useRef<HTMLLIElement>(null);
  useEffect(() => {
    if (state === 'open') row.current?.scrollIntoView({ block: 'nearest' });
  }, [state]);
  const insteadOf = insteadText(chapter, names, kit);
  return (
    <li
      ref={row}
      className={clsx(
        // clear of the picture that stays in view above the list on a phone
        'scroll-my-4 border-b border-line last:border-b-0 max-sm:[@media(min-height:40rem)]:scroll-mt-[60vw]',
        state === 'open' && 'bg-tint',
        playing ? 'border-l-4 border-l-yellow' : 'border-l-4 border-l-transparent',
      )}
    >
      <button
        type="button"
        aria-expanded={state === 'open'}
        aria-current={playing ? 'time' : undefined}
        className={clsx(
          rowColumns,
          'min-h-target w-full py-2 pe-2.5 ps-1.5 text-start text-sm leading-snug focus-visible:outline-offset-[-3px] hover:bg-raised',
          chapter.kind === 'aside' && 'text-ink2',
        )}
        onMouseDown={keepKeys}
        onClick={onSelect}
      >
        <span className="font-extrabold">{formatMsWithTenths(chapter.startMs)}</span>
        <span className="text-ink2">{formatMs(chapter.endMs - chapter.startMs)}</span>
        <TapeStrip kind={chapter.kind} label={kindNames[chapter.kind]} className="mt-0.5 w-10" />
        <span className="min-w-0 wrap-anywhere">
          <span className="block font-extrabold">{chapter.title}</span>
          {insteadOf && <span className="block text-ink2">{insteadOf}</span>}
          {block && <span className="block text-ink2 @md:hidden">{block}</span>}
        </span>
        <span className="wrap-anywhere text-ink2 @max-md:hidden">{block}</span>
      </button>
      {faults.length > 0 && (
        <ul className="px-2.5 pb-2 text-sm" aria-label={`To mend in “${chapter.title}”`}>
          {faults.map((fault) => (
            <li
              key={fault.message}
              className={clsx('flex gap-1.5', fault.severity === 'refused' ? 'font-bold text-danger' : 'text-ink2')}
            >
              <Icon name="warning" size={16} className="mt-0.5" />
              <span>{fault.message}</span>
            </li>
          ))}
        </ul>
      )}
      {children}
    </li>
  );
}

/** “for ring row · no rings” */
function insteadText(chapter: Chapter, names: Names, kit: readonly KitItem[]): string {
  if (chapter.kind !== 'substitution') return '';
  const original = chapter.standsInForMovementId && names.get(chapter.standsInForMovementId);
  const item = kit.find(({ id }) => id === chapter.missingKitItemId);
  const without = { kit: item?.withoutText ?? 'less kit', space: 'little space', ability: 'easier' };
  return [original && `for ${original.toLowerCase()}`, chapter.missing && without[chapter.missing]]
    .filter(Boolean)
    .join(' · ');
}
