import type { RefObject } from 'react';
import type { CaptionLine } from '../../../shared/domain/captions/captionLine';
import { Button } from '../../components/Button';
import { Key } from '../../components/Key';
import { TimeField } from '../../components/TimeField';
import type { Playhead } from '../../lib/playhead';
import type { LineEdits } from './useLineEdits';

type Props = {
  line: CaptionLine;
  index: number;
  last: boolean;
  edits: LineEdits;
  playhead: Playhead;
  field: RefObject<HTMLTextAreaElement | null>;
};

/** What can be done with the line that one is at: its times, and the edits that change how many lines there are. */
export function LineTools({ line, index, last, edits, playhead, field }: Props) {
  const place = () => field.current?.selectionStart ?? 0;
  return (
    <div className="flex flex-wrap items-end gap-x-2 gap-y-1.5 px-3 pt-0.5 pb-2.5">
      <TimeField
        label="Start"
        value={line.startMs}
        className="w-26"
        onCommit={(startMs) => edits.move(index, { startMs })}
      />
      <TimeField label="End" value={line.endMs} className="w-26" onCommit={(endMs) => edits.move(index, { endMs })} />
      <Button size="small" onClick={() => edits.move(index, { startMs: Math.round(playhead.atMs()) })}>
        Start here <Key name="s" />
      </Button>
      <Button size="small" onClick={() => edits.move(index, { endMs: Math.round(playhead.atMs()) })}>
        End here <Key name="e" />
      </Button>
      <Button
        size="small"
        // the cursor's place is read before the field loses it
        onMouseDown={(event) => event.preventDefault()}
        onClick={() => edits.split(index, place(), 'by share')}
      >
        Split at the cursor <Key name="Enter" />
      </Button>
      {!last && (
        <Button size="small" onClick={() => edits.join(index)}>
          Join with the next <Key name="m" />
        </Button>
      )}
      <Button size="small" onClick={() => edits.insert(index)}>
        Add after <Key name="a" />
      </Button>
      <Button size="small" look="danger" onClick={() => edits.remove(index)}>
        Delete <Key name="Delete" />
      </Button>
      <p className="basis-full text-xs text-ink2">
        <Key name="Shift+Enter" /> a new row · <Key name="Mod+Enter" /> splits where the picture is · <Key name="t" />{' '}
        into the text, <Key name="Escape" /> out of it
      </p>
    </div>
  );
}
