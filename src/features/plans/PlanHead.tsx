import { useState } from 'react';
import { Button } from '../../components/Button';
import { Icon } from '../../components/Icon';
import { TextAreaField, TextField } from '../../components/TextField';
import type { PlanEdits } from './usePlanEdits';
import type { WrittenPlan } from './writtenPlan';

/** What is said about a session before its blocks. */
export function PlanHead({ plan, edits }: { plan: WrittenPlan; edits: PlanEdits }) {
  const [note, setNote] = useState<'shown' | 'hidden'>(plan.note === '' ? 'hidden' : 'shown');
  return (
    <div className="@container">
      <div className="grid gap-x-2.5 gap-y-3 @[30rem]:grid-cols-[minmax(0,1fr)_11rem]">
        <TextField
          label="Title"
          maxLength={120}
          value={plan.title}
          error={plan.title.trim() === '' ? 'Give the session a title.' : undefined}
          onChange={(event) => edits.setHead({ title: event.target.value })}
        />
        <TextField
          label="Day"
          type="date"
          value={plan.date}
          error={plan.date === '' ? 'Choose the day of the session.' : undefined}
          onChange={(event) => edits.setHead({ date: event.target.value })}
        />
        <TextField
          label="Aim"
          optional
          className="col-span-full"
          maxLength={200}
          placeholder="7 to 9 rounds"
          value={plan.aim}
          onChange={(event) => edits.setHead({ aim: event.target.value })}
        />
        {note === 'shown' || plan.note !== '' ? (
          <TextAreaField
            label="Note"
            optional
            rows={1}
            className="col-span-full [&_textarea]:min-h-target!"
            maxLength={2000}
            autoFocus={plan.note === ''}
            value={plan.note}
            onChange={(event) => {
              setNote('shown');
              edits.setHead({ note: event.target.value });
            }}
          />
        ) : (
          <Button size="small" look="quiet" className="justify-self-start" onClick={() => setNote('shown')}>
            <Icon name="add" size={16} />
            Add a note
          </Button>
        )}
      </div>
    </div>
  );
}
