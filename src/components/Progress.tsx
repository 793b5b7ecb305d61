import { type ReactNode, useId } from 'react';
import { formatShare } from '../lib/format';
import { TapeStrip } from './TapeStrip';

type Props = {
  /** what goes on: “take-1.mov”, “Making the playback version” */
  label: ReactNode;
  /** 0 to 1; `null` when it cannot be told */
  share: number | null;
  /** more about it: “320 MB of 1.2 GB, about 4 min left” */
  note?: ReactNode;
  state?: 'running' | 'failed';
};

/** How far a long wait is: tape laid along a dotted line, and the same in words. */
export function Progress({ label, share, note, state = 'running' }: Props) {
  const id = useId();
  const value = share === null ? undefined : Math.floor(Math.min(1, Math.max(0, share)) * 100);
  return (
    <div className="text-sm">
      <div className="flex items-baseline gap-3">
        <span id={id} className="min-w-0 font-bold wrap-anywhere">
          {label}
        </span>
        {share !== null && <span className="ms-auto flex-none font-extrabold">{formatShare(share)}</span>}
      </div>
      <div
        role="progressbar"
        aria-labelledby={id}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={value}
        className="relative my-1.5 h-3.5"
      >
        <TapeStrip kind="plain" laid="empty" className="w-full" />
        {value !== 0 && state === 'running' && (
          <TapeStrip
            kind="plain"
            className={value === undefined ? 'laying absolute! top-0' : 'absolute! top-0'}
            style={value === undefined ? undefined : { width: `${value}%` }}
          />
        )}
      </div>
      {note && <div className={state === 'failed' ? 'font-bold text-danger' : 'text-ink2'}>{note}</div>}
    </div>
  );
}
