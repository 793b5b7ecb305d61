import { standardSchemaResolver } from '@hookform/resolvers/standard-schema';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { PlanFields } from '../../../shared/contracts/sessions';
import { Button } from '../../components/Button';
import { Dialog } from '../../components/Dialog';
import { FormFault } from '../../components/FormFault';
import { GoButton } from '../../components/GoButton';
import { TextField } from '../../components/TextField';
import { showRefusal } from '../../lib/forms';
import { useCreateSession } from './api';

const Values = PlanFields.pick({ date: true, title: true });

type Props = {
  team: string /** the day to start from */;
  day: string;
  onMade: (sessionId: string) => void;
  onClose: () => void;
};

/** Asks for no more than a session's day and name; the rest is written on its page. */
export function NewSessionDialog({ team, day, onMade, onClose }: Props) {
  // one id a dialog: a second press makes no second session
  const [id] = useState(() => crypto.randomUUID());
  const create = useCreateSession(team);
  const [fault, setFault] = useState<string | null>(null);
  const form = useForm({ resolver: standardSchemaResolver(Values), defaultValues: { date: day, title: '' } });
  const { errors } = form.formState;
  const send = form.handleSubmit((plan) => {
    setFault(null);
    create.mutate(
      { id, ...plan },
      {
        onSuccess: (session) => onMade(session.id),
        onError: (error) => setFault(showRefusal(error, ['date', 'title'], form.setError)),
      },
    );
  });
  return (
    <Dialog
      open
      onClose={onClose}
      title="Plan a session"
      actions={
        <>
          <Button onClick={onClose}>Leave it</Button>
          <GoButton busy={create.isPending ? 'Making it' : undefined} onClick={() => void send()}>
            Start the plan
          </GoButton>
        </>
      }
    >
      <form
        noValidate
        className="grid gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          if (!create.isPending) void send();
        }}
      >
        <TextField
          label="Day"
          type="date"
          error={errors.date && 'Choose the day of the session.'}
          {...form.register('date')}
        />
        <TextField
          label="Title"
          maxLength={120}
          autoComplete="off"
          placeholder="Step, row, skip"
          data-first-focus
          error={errors.title?.message}
          {...form.register('title')}
        />
        <FormFault>{fault}</FormFault>
        <button type="submit" hidden />
      </form>
    </Dialog>
  );
}
