import { clsx } from 'clsx';
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

/** on a phone the piece that one sees is as large as its target */
const tall = 'max-md:min-h-target!';

const rates = [0.5, 0.75, 1, 1.25] as const;

/** How it is watched: over and over, as in a mirror, with words, slower or faster. */
export function Switches({ playhead, loop, onLoop, picture, onMirror, captions, onCaptions }: Props) {
  const { rate } = usePlayState(playhead);
  const [keys, setKeys] = useState<'open' | 'closed'>('closed');
  return (
    <div className="grid grid-cols-4 gap-2 md:flex md:flex-wrap md:items-center md:gap-x-6">
      <div className="col-span-4 flex flex-wrap gap-2 max-md:*:grow">
        <ToggleChip pressed={loop === 'on'} className={tall} onClick={onLoop}>
          Loop
        </ToggleChip>
        <ToggleChip pressed={picture === 'mirrored'} className={tall} onClick={onMirror}>
          Mirror
        </ToggleChip>
        {captions !== 'none' && (
          <ToggleChip pressed={captions === 'shown'} className={tall} onClick={onCaptions}>
            Captions
          </ToggleChip>
        )}
      </div>
      <fieldset className="col-span-4 flex flex-wrap gap-2 max-md:*:grow">
        <legend className="sr-only">Speed</legend>
        {rates.map((each) => (
          <ToggleChip
            key={each}
            pressed={rate === each}
            className={clsx(tall, 'md:min-w-15')}
            onClick={() => playhead.setRate(each)}
          >
            {each}×
          </ToggleChip>
        ))}
      </fieldset>
      <Button look="quiet" size="small" className="max-md:hidden md:ms-auto" onClick={() => setKeys('open')}>
        Keys
      </Button>
      <KeysDialog open={keys === 'open'} onClose={() => setKeys('closed')} />
    </div>
  );
}
