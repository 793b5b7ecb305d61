import { useState } from 'react';
import { Button } from '../../components/Button';
import { ToggleChip } from '../../components/Chip';
import { type Playhead, usePlayState } from '../../lib/playhead';
import { KeysDialog } from './KeysDialog';

type Props = {
  playhead: Playhead;
  loop: 'on' | 'off';
  onLoop: () => void;
  picture: 'as filmed' | 'mirrored';
  onMirror: () => void;
  /** `none` when the recording has no captions */
  captions: 'shown' | 'hidden' | 'none';
  onCaptions: () => void;
};

const rates = [0.5, 0.75, 1, 1.25] as const;

/** How it is watched: over and over, as in a mirror, with words, slower or faster. */
export function Switches({ playhead, loop, onLoop, picture, onMirror, captions, onCaptions }: Props) {
  const { rate } = usePlayState(playhead);
  const [keys, setKeys] = useState<'open' | 'closed'>('closed');
  return (
    <div className="grid grid-cols-4 gap-2 md:flex md:flex-wrap md:items-center">
      {/* a row of its own on a phone, under the other switches */}
      <fieldset className="order-2 col-span-4 grid grid-cols-4 gap-2 md:order-1 md:flex">
        <legend className="sr-only">Speed</legend>
        {rates.map((each) => (
          <ToggleChip
            key={each}
            pressed={rate === each}
            className="min-h-target md:min-w-15"
            onClick={() => playhead.setRate(each)}
          >
            {each}×
          </ToggleChip>
        ))}
      </fieldset>
      <div className="order-1 col-span-4 grid grid-flow-col gap-2 md:order-2 md:flex">
        <ToggleChip pressed={loop === 'on'} className="min-h-target" onClick={onLoop}>
          Loop
        </ToggleChip>
        <ToggleChip pressed={picture === 'mirrored'} className="min-h-target" onClick={onMirror}>
          Mirror
        </ToggleChip>
        {captions !== 'none' && (
          <ToggleChip pressed={captions === 'shown'} className="min-h-target" onClick={onCaptions}>
            Captions
          </ToggleChip>
        )}
      </div>
      <Button
        look="quiet"
        size="small"
        className="order-3 min-h-target max-md:hidden md:ms-auto"
        onClick={() => setKeys('open')}
      >
        Keys
      </Button>
      <KeysDialog open={keys === 'open'} onClose={() => setKeys('closed')} />
    </div>
  );
}
