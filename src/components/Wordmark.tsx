import { TapeStrip } from './TapeStrip';

/** The mark: a piece of tape and the name. */
export function Wordmark() {
  return (
    <span className="inline-flex items-center gap-2 text-md font-black tracking-tight text-ink">
      <TapeStrip kind="demo" className="h-3! w-7.5" />
      Tapeline
    </span>
  );
}
