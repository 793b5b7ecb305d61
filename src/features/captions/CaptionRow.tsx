import { clsx } from 'clsx';
import { type KeyboardEvent, useLayoutEffect, useRef } from 'react';
import type { CaptionLine } from '../../../shared/domain/captions/captionLine';
import { formatMsWithTenths, spokenMs } from '../../../shared/domain/timecode';
import { keepKeys } from '../../components/keepKeys';
import type { Playhead } from '../../lib/playhead';
import { LineTools } from './LineTools';
import type { LineFault } from './lineFaults';
import type { LineEdits } from './useLineEdits';

type Props = {
  line: CaptionLine;
  index: number;
  state: 'open' | 'closed';
  said: boolean;
  last: boolean;
  faults: readonly LineFault[];
  edits: LineEdits;
  playhead: Playhead;
};

/** A line: its time plays it, its text is written in place as in a text: Enter splits, Backspace at its start joins. */
export function CaptionRow({ line, index, state, said, last, faults, edits, playhead }: Props) {
  const field = useRef<HTMLTextAreaElement>(null);
  const typed = edits.typed?.index === index ? edits.typed.text : null;
  const problem = state === 'open' ? edits.refused : null;
  const { caret } = edits;
  useLayoutEffect(() => {
    const wanted = caret.current;
    if (!field.current || wanted?.index !== index) return;
    caret.current = null;
    field.current.focus();
    if (wanted.character < 0) field.current.select();
    else field.current.setSelectionRange(wanted.character, wanted.character);
  });

  const press = (event: KeyboardEvent<HTMLTextAreaElement>) => {
    if (event.nativeEvent.isComposing) return;
    const { selectionStart: from, selectionEnd: to, value } = event.currentTarget;
    const mod = event.ctrlKey || event.metaKey;
    const goTo = (next: number, character: number) => {
      event.preventDefault();
      caret.current = { index: next, character };
      edits.leave();
      edits.select(next, 'stay');
    };
    if (event.key === 'Enter' && !event.shiftKey) {
      event.preventDefault();
      edits.split(index, from, mod ? 'at the picture' : 'by share');
    } else if (event.key === 'Backspace' && from === 0 && to === 0 && index > 0 && !event.repeat) {
      event.preventDefault();
      edits.join(index - 1);
    } else if (event.key === 'Delete' && from === value.length && !last && !event.repeat) {
      event.preventDefault();
      edits.join(index);
    } else if (event.key === 'ArrowUp' && from === to && index > 0 && !value.slice(0, from).includes('\n'))
      goTo(index - 1, 0);
    else if (event.key === 'ArrowDown' && from === to && !last && !value.slice(from).includes('\n')) goTo(index + 1, 0);
  };

  return (
    <div
      className={clsx(
        'border-b border-l-4 border-b-line',
        state === 'open' && 'bg-tint',
        said ? 'border-l-yellow' : 'border-l-transparent',
      )}
    >
      <div className="grid grid-cols-[4.5rem_minmax(0,1fr)] items-start gap-x-2 px-1.5 @md:grid-cols-[4.5rem_3rem_minmax(0,1fr)_auto]">
        <button
          type="button"
          className="min-h-targetSmall rounded px-1.5 text-start text-sm leading-none font-extrabold hover:bg-raised"
          aria-label={`Play from ${spokenMs(line.startMs)}`}
          onMouseDown={keepKeys}
          onClick={() => edits.play(index)}
        >
          {formatMsWithTenths(line.startMs)}
        </button>
        <span className="pt-2 text-sm text-ink2 @max-md:hidden">
          {((line.endMs - line.startMs) / 1000).toFixed(1)} s
        </span>
        <textarea
          ref={field}
          rows={line.text.split('\n').length}
          maxLength={500}
          aria-label={`Line at ${formatMsWithTenths(line.startMs)}`}
          aria-invalid={problem ? true : undefined}
          aria-describedby={problem || faults.length > 0 ? `line-${index}-faults` : undefined}
          spellCheck
          lang="en"
          className="field-sizing-content block min-h-targetSmall w-full min-w-0 resize-none rounded bg-transparent px-1.5 py-1.5 text-md leading-snug focus-visible:outline-offset-[-3px]"
          value={typed ?? line.text}
          onFocus={() => edits.at !== index && edits.select(index, 'stay')}
          onChange={(event) => edits.write(index, event.target.value)}
          onBlur={edits.leave}
          onKeyDown={press}
        />
        <div
          id={`line-${index}-faults`}
          className="col-start-2 text-sm @md:col-start-4 @md:max-w-48 @md:pt-2 @md:text-end"
        >
          {problem && <p className="font-bold text-danger">{problem}</p>}
          {faults.map(({ short, message, kind }) => (
            <p key={message} title={message} className={kind === 'speed' ? 'font-bold text-danger' : 'text-ink2'}>
              <span aria-hidden="true">{short}</span>
              <span className="sr-only">{message}</span>
            </p>
          ))}
        </div>
      </div>
      {state === 'open' && <LineTools {...{ line, index, last, edits, playhead, field }} />}
    </div>
  );
}
