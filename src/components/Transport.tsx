import type { ReactNode } from 'react';
import { formatMs, formatMsWithTenths, spokenMs } from '../../shared/domain/timecode';
import { useKeys } from '../lib/keys';
import { type Playhead, useAtMs, usePlayState } from '../lib/playhead';
import { Button } from './Button';
import { Icon } from './Icon';
import { Key } from './Key';
import { SmallSelect } from './SmallSelect';

type Props = {
  playhead: Playhead;
  /** ms; from the recording, so that it is known before the picture is there */
  durationMs: number;
  /** drawn over the seek bar, from its start to its end: the tape of the chapters */
  strip?: ReactNode;
};

const rates = [0.5, 0.75, 1, 1.25, 1.5, 2] as const;
const steps = [
  { by: -1000, label: '−1 s', name: 'Back 1 second', hotkey: 'ArrowLeft' },
  { by: -100, label: '−0.1', name: 'Back 0.1 seconds', hotkey: 'Shift+ArrowLeft' },
  { by: 100, label: '+0.1', name: 'On 0.1 seconds', hotkey: 'Shift+ArrowRight' },
  { by: 1000, label: '+1 s', name: 'On 1 second', hotkey: 'ArrowRight' },
] as const;

/** What moves the picture on the desk, with the keys beside it. */
export function Transport({ playhead, durationMs, strip }: Props) {
  const { state, rate, fault } = usePlayState(playhead);
  const playing = state === 'playing' || state === 'waiting';
  const toggle = () => playhead.toggle();
  useKeys({
    Space: toggle,
    ...Object.fromEntries(steps.map(({ by, hotkey }) => [hotkey, () => playhead.seekTo(playhead.atMs() + by)])),
  });
  return (
    // biome-ignore lint/a11y/useSemanticElements: a fieldset would need a legend that is shown
    <div role="group" aria-label="Player">
      <SeekBar playhead={playhead} durationMs={durationMs} strip={strip} />
      <div className="mt-1 flex flex-wrap items-center gap-x-1.5 gap-y-2">
        <Button size="small" className="min-w-32" onClick={toggle}>
          <Icon name={playing ? 'pause' : 'play'} size={16} />
          {playing ? 'Pause' : 'Play'}
          <Key name="Space" />
        </Button>
        {steps.map(({ by, label, name }) => (
          <Button
            key={by}
            look="quiet"
            size="small"
            className="px-2!"
            aria-label={name}
            onClick={() => playhead.seekTo(playhead.atMs() + by)}
          >
            {label}
          </Button>
        ))}
        <SmallSelect
          label="Speed"
          value={rate}
          options={rates.map((one) => ({ value: one, label: `${one}×` }))}
          onChange={(event) => playhead.setRate(Number(event.target.value))}
        />
        <p className="flex flex-wrap items-center gap-x-1.5 gap-y-1 text-sm text-ink2 max-sm:hidden">
          <Key name="ArrowLeft" /> <Key name="ArrowRight" /> 1 s, with <Key name="Shift" /> 0.1 s
        </p>
        <Clock playhead={playhead} />
      </div>
      {fault && (
        <p role="alert" className="mt-1 text-sm font-bold text-danger">
          {fault}
        </p>
      )}
    </div>
  );
}

function Clock({ playhead }: { playhead: Playhead }) {
  const at = useAtMs(playhead, 100);
  return <span className="ms-auto text-lg leading-none font-black">{formatMsWithTenths(at)}</span>;
}

function SeekBar({ playhead, durationMs, strip }: Props) {
  const at = useAtMs(playhead, 100);
  return (
    <div className="pt-2">
      {strip}
      <input
        type="range"
        aria-label="Place in the recording"
        aria-valuetext={`${spokenMs(at)} of ${formatMs(durationMs)}`}
        min={0}
        max={Math.max(durationMs, 1)}
        step={100}
        value={Math.min(at, durationMs)}
        className="m-0 block h-6 w-full accent-ink"
        onChange={(event) => playhead.seekTo(Number(event.target.value))}
      />
    </div>
  );
}
