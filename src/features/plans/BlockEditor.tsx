import { useState } from 'react';
import { blockKinds } from '../../../shared/domain/words';
import { Button } from '../../components/Button';
import { Icon } from '../../components/Icon';
import { IconButton } from '../../components/IconButton';
import { TapeStrip } from '../../components/TapeStrip';
import { SelectField, TextAreaField, TextField } from '../../components/TextField';
import { blockName, blockWords } from './blockWords';
import { LineEditor, lineGrid } from './LineEditor';
import type { PlanLibrary } from './planLibrary';
import { SchemeField } from './SchemeField';
import { Toolbar } from './Toolbar';
import type { PlanEdits } from './usePlanEdits';
import type { WrittenBlock } from './writtenPlan';

const kindOptions = blockKinds.map((value) => ({ value, label: blockWords[value] }));

type Props = { block: WrittenBlock; place: number; of: number; edits: PlanEdits; library: PlanLibrary };

/** A block: its head as tape, how it is done, its lines. */
export function BlockEditor({ block, place, of, edits, library }: Props) {
  const { id, lines } = block;
  const [noteOpen, setNoteOpen] = useState(false);
  const name = blockName(block);
  return (
    <section data-of={id} aria-label={`Block ${place}: ${name}`} className="@container">
      <div className="flex flex-wrap items-center gap-x-3 @[32rem]:flex-nowrap">
        <TapeStrip kind={block.kind} className="w-23" />
        <h3 className="order-last min-w-0 basis-full text-md @[32rem]:order-none @[32rem]:grow @[32rem]:basis-0 font-extrabold wrap-anywhere">
          {name}
        </h3>
        <Toolbar label={`Change ${name}`} className="ms-auto flex">
          <IconButton
            icon="chevron"
            label="Move the block up"
            look="quiet"
            className="rotate-180"
            disabled={place === 1}
            data-part="up"
            onClick={() => edits.moveBlock(id, -1)}
          />
          <IconButton
            icon="chevron"
            label="Move the block down"
            look="quiet"
            disabled={place === of}
            data-part="down"
            onClick={() => edits.moveBlock(id, 1)}
          />
          <IconButton icon="trash" label="Remove the block" look="quiet" onClick={() => edits.removeBlock(id)} />
        </Toolbar>
      </div>
      <div className="mt-1 grid grid-cols-[8.5rem_minmax(0,1fr)] gap-x-2.5 gap-y-2 @[43rem]:grid-cols-[9.5rem_minmax(0,1fr)_minmax(0,1.2fr)]">
        <div data-part="kind">
          <SelectField
            label="Kind"
            options={kindOptions}
            value={block.kind}
            onChange={(event) => {
              const kind = blockKinds.find((one) => one === event.target.value);
              if (kind) edits.setBlock(id, { kind });
            }}
          />
        </div>
        <TextField
          label="Title"
          optional
          maxLength={120}
          value={block.title}
          onChange={(event) => edits.setBlock(id, { title: event.target.value })}
        />
        <SchemeField
          label="Scheme"
          optional
          className="col-span-2 @[43rem]:col-span-1"
          value={block.scheme}
          onChange={(scheme) => edits.setBlock(id, { scheme })}
        />
        {(noteOpen || block.note !== '') && (
          <TextAreaField
            label="Note"
            optional
            rows={1}
            className="col-span-full [&_textarea]:min-h-target!"
            maxLength={1000}
            autoFocus={noteOpen && block.note === ''}
            value={block.note}
            onChange={(event) => {
              setNoteOpen(true);
              edits.setBlock(id, { note: event.target.value });
            }}
          />
        )}
      </div>
      {lines.length > 0 && (
        <div
          aria-hidden="true"
          className={`mt-2 hidden gap-x-2.5 border-b border-line pb-1.5 text-xs font-bold text-ink2 @[32rem]:grid ${lineGrid}`}
        >
          <span>Movement</span>
          <span>Dose</span>
          <span className="hidden @[50rem]:inline">Demo</span>
          <span className="hidden @[50rem]:inline">Instead, when missing</span>
        </div>
      )}
      <ol>
        {lines.map((line, at) => (
          <LineEditor
            key={line.id}
            line={line}
            place={at + 1}
            isFirst={at === 0 && place === 1}
            isLast={at === lines.length - 1 && place === of}
            edits={edits}
            library={library}
          />
        ))}
      </ol>
      <div className="mt-1.5 flex flex-wrap gap-2">
        <Button size="small" look="quiet" data-part="add" onClick={() => edits.addLine(id)}>
          <Icon name="add" size={16} />
          Add a movement
        </Button>
        {!noteOpen && block.note === '' && (
          <Button size="small" look="quiet" onClick={() => setNoteOpen(true)}>
            <Icon name="add" size={16} />
            Add a note
          </Button>
        )}
      </div>
    </section>
  );
}
