import { clsx } from 'clsx';
import { type KeyboardEvent, useId, useState } from 'react';
import { formatMsExactly, parseTime } from '../../shared/domain/timecode';
import { inputLook } from './Field';

type Props = {
  /** read out, and shown unless hidden */
  label: string;
  labelled?: 'shown' | 'hidden';
  /** ms */
  value: number;
  onCommit: (ms: number) => void;
  error?: string | undefined;
  className?: string;
};

const steps: Record<string, number> = { ArrowUp: 100, ArrowDown: -100, PageUp: 1000, PageDown: -1000 };

/** A time as people type it: `4:31.2`, `271.2`. Taken over on Enter or on leaving; arrows move it by 0.1 s, Page Up and Page Down by 1 s. */
export function TimeField({ label, labelled = 'shown', value, onCommit, error, className }: Props) {
  const id = useId();
  const [typed, setTyped] = useState<string | null>(null);
  const read = typed === null ? value : parseTime(typed);
  const problem = read === null ? 'Write a time like 4:31.2.' : error;

  const take = () => {
    if (typed !== null && read !== null && read !== value) onCommit(read);
    setTyped(null);
  };
  const press = (event: KeyboardEvent) => {
    const step = steps[event.key];
    if (event.key === 'Enter') {
      event.preventDefault();
      if (read !== null) take();
    } else if (event.key === 'Escape') setTyped(null);
    else if (step !== undefined && read !== null) {
      event.preventDefault();
      setTyped(null);
      onCommit(Math.max(0, read + step));
    }
  };

  return (
    <div className={className}>
      <label htmlFor={id} className={labelled === 'hidden' ? 'sr-only' : 'mb-1 block text-sm font-bold'}>
        {label}
      </label>
      <input
        id={id}
        type="text"
        inputMode="decimal"
        autoComplete="off"
        spellCheck={false}
        aria-invalid={problem ? true : undefined}
        aria-describedby={problem ? `${id}-error` : undefined}
        className={clsx(inputLook, 'px-2! font-bold')}
        value={typed ?? formatMsExactly(value)}
        onChange={(event) => setTyped(event.target.value)}
        onBlur={take}
        onKeyDown={press}
      />
      {problem && (
        <div id={`${id}-error`} className="mt-1 text-sm font-bold text-danger">
          {problem}
        </div>
      )}
    </div>
  );
}
