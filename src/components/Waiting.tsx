import { TapeStrip } from './TapeStrip';

/** For waits without a shape of their own: tape being laid, shown only when it takes over 300 ms. */
export function Waiting({ label }: { label: string }) {
  return (
    <div role="status" className="shown-late inline-flex items-center gap-3 text-sm text-ink2">
      <span className="relative block w-16">
        <TapeStrip kind="plain" laid="empty" size="thin" className="w-full" />
        <TapeStrip kind="plain" size="thin" className="laying absolute! top-0" />
      </span>
      {label}
    </div>
  );
}
