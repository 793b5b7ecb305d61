import { standardSchemaResolver } from '@hookform/resolvers/standard-schema';
import { useQuery } from '@tanstack/react-query';
import { useId, useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { Recording } from '../../../shared/contracts/recordings';
import { shortText } from '../../../shared/domain/values';
import { Button } from '../../components/Button';
import { Dialog } from '../../components/Dialog';
import { GoButton } from '../../components/GoButton';
import { SelectField, TextField } from '../../components/TextField';
import { announce } from '../../lib/announce';
import { ApiError } from '../../lib/api';
import { showRefusal } from '../../lib/forms';
import { sessionsToChooseQuery, useUpdateRecording } from './api';
import { sessionOptions } from './sessionOptions';

type Props = { team: string; recording: Recording; onClose: () => void };

const Fields = z.object({ title: shortText(120), take: z.int().min(1).max(99), sessionId: z.string() });
type Fields = z.infer<typeof Fields>;

const none = '';

/** A recording's title, its take and the session that it belongs to. */
export function ChangeRecording({ team, recording, onClose }: Props) {
  const formId = useId();
  const sessions = useQuery(sessionsToChooseQuery(team));
  const update = useUpdateRecording(team);
  // what the form started from: a save by somebody else meanwhile is told, not passed over
  const [version, setVersion] = useState(recording.version);
  const [fault, setFault] = useState<string | null>(null);
  const { register, handleSubmit, setError, formState } = useForm<Fields>({
    resolver: standardSchemaResolver(Fields),
    defaultValues: { title: recording.title, take: recording.take, sessionId: recording.session?.id ?? none },
  });

  const save = handleSubmit(async ({ sessionId, ...fields }) => {
    setFault(null);
    try {
      await update.mutateAsync({
        ...fields,
        recordingId: recording.id,
        sessionId: sessionId === none ? null : sessionId,
        version,
      });
      announce('Saved');
      onClose();
    } catch (error) {
      const theirs = error instanceof ApiError && error.code === 'stale' ? Recording.safeParse(error.current) : null;
      if (!theirs?.success) return setFault(showRefusal(error, ['title', 'take', 'sessionId'], setError));
      setVersion(theirs.data.version);
      setFault(`${wordsOf(theirs.data)} Save again to put yours in its place.`);
    }
  });

  return (
    <Dialog
      open
      onClose={onClose}
      title="Title, take, session"
      actions={
        <>
          <Button onClick={onClose}>Leave it</Button>
          <GoButton type="submit" form={formId} busy={formState.isSubmitting ? 'Saving' : undefined}>
            Save
          </GoButton>
        </>
      }
    >
      <form id={formId} noValidate onSubmit={(event) => void save(event)} className="space-y-4">
        <TextField label="Title" error={formState.errors.title?.message} {...register('title')} />
        <TextField
          label="Take"
          type="number"
          min={1}
          max={99}
          inputMode="numeric"
          className="w-28"
          error={formState.errors.take && 'A number from 1 to 99.'}
          {...register('take', { valueAsNumber: true })}
        />
        {sessions.isPending ? (
          <SelectField label="Session" disabled options={[{ value: none, label: 'Sessions are on the way' }]} />
        ) : (
          <SelectField
            label="Session"
            hint="In another session, its chapters show none of the old one’s blocks."
            options={[{ value: none, label: 'No session' }, ...sessionOptions(sessions.data ?? [], recording.session)]}
            error={
              formState.errors.sessionId?.message ?? (sessions.isError ? 'The sessions did not arrive.' : undefined)
            }
            {...register('sessionId')}
          />
        )}
        {fault && (
          <p role="alert" className="font-bold text-danger">
            {fault}
          </p>
        )}
      </form>
    </Dialog>
  );
}

function wordsOf({ title, take, session }: Recording): string {
  return `Somebody changed it meanwhile: “${title}”, take ${take}, ${session ? `in “${session.title}”` : 'without a session'}.`;
}
