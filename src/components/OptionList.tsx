import { clsx } from 'clsx';
import { type ReactNode, type RefObject, useEffect, useLayoutEffect, useRef } from 'react';
import type { ChapterKind } from '../../shared/domain/words';
import { usePlacement } from '../lib/placement';
import { Icon } from './Icon';
import { TapeStrip } from './TapeStrip';

export type Option = {
  value: string;
  label: string;
  /** a word more, at the end: “also: step ups”, “needs a box” */
  note?: ReactNode;
  tape?: ChapterKind;
};

type Props = {
  id: string;
  label: string;
  anchor: RefObject<HTMLElement | null>;
  options: readonly Option[];
  /** index of the option that Enter would take; -1 for none */
  active: number;
  chosen?: string | null;
  /** said below the options: “Nothing fits”, “On the way” */
  note?: ReactNode;
  onPoint: (index: number) => void;
  onTake: (option: Option) => void;
};

/** The listbox of a typed choice (ARIA 1.2 combobox): in the top layer, so that nothing cuts it off. The focus stays in the field. */
export function OptionList({ id, label, anchor, options, active, chosen, note, onPoint, onTake }: Props) {
  const list = useRef<HTMLDivElement>(null);
  useLayoutEffect(() => list.current?.showPopover(), []);
  usePlacement(anchor, list, 'open', 'fill');
  useEffect(() => {
    if (active >= 0) list.current?.querySelector(`[data-at="${active}"]`)?.scrollIntoView({ block: 'nearest' });
  }, [active]);

  return (
    // biome-ignore lint/a11y/noStaticElementInteractions: a press in the list must not take the focus out of the field
    <div ref={list} popover="manual" className="floating" onMouseDown={(event) => event.preventDefault()}>
      <div id={id} role="listbox" aria-label={label}>
        {options.map((option, at) => (
          // biome-ignore lint/a11y/useKeyWithClickEvents: the keys are the field's
          // biome-ignore lint/a11y/useFocusableInteractive: the field keeps the focus and names the active option
          <div
            key={option.value}
            id={`${id}-${at}`}
            data-at={at}
            role="option"
            aria-selected={option.value === chosen}
            className={clsx(
              'flex min-h-target cursor-pointer items-center gap-3 rounded px-2.5 py-1.5 leading-tight',
              at === active && 'bg-raised',
            )}
            onMouseMove={() => onPoint(at)}
            onClick={() => onTake(option)}
          >
            {option.tape && <TapeStrip kind={option.tape} className="w-8" />}
            <span className="min-w-0 font-bold wrap-anywhere">{option.label}</span>
            {option.value === chosen && <Icon name="check" size={16} />}
            {option.note && <span className="ms-auto max-w-1/2 text-end text-sm text-ink2">{option.note}</span>}
          </div>
        ))}
      </div>
      {note && <div className="px-2.5 py-2 text-sm text-ink2">{note}</div>}
    </div>
  );
}
