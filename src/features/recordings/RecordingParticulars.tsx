import { standardSchemaResolver } from '@hookform/resolvers/standard-schema';
import { useQuery } from '@tanstack/react-query';
import { Controller, useForm } from 'react-hook-form';
import { z } from 'zod';
import type { Recording } from '../../../shared/contracts/recordings';
import { Id, shortText } from '../../../shared/domain/values';
import { Button } from '../../components/Button';
import { Combobox } from '../../components/Combobox';
import { Dialog } from '../../components/Dialog';
import { GoButton } from '../../components/GoButton';
import { TextField } from '../../components/TextField';
import { ApiError } from '../../lib/api';
import { formatDate } from '../../lib/format';
import { sessionsToLink, useUpdateRecording } from './oneRecording';

const Particulars = z.object({
  title: shortText(120),
  take: z.int('Write a number from 1 to 99.').min(1, 'Takes start at 1.').max(99, 'At most 99.'),
  sessionId: Id.nullable(),
});
type Particulars = z.infer<typeof Particulars>;

type Props = { team: string; recording: Recording; open: boolean; onClose: () => void };

/** Title, take and the session that a recording belongs to. */
export function RecordingParticulars({ open, ...rest }: Props) {
  return open ? <ParticularsDialog {...rest} /> : null;
}

function ParticularsDialog({ team, recording, onClose }: Omit<Props, 'open'>) {
  const update = useUpdateRecording(team);
  const { data: sessions, isPending, error } = useQuery(sessionsToLink(team));
  const form = useForm<Particulars>({
    resolver: standardSchemaResolver(Particulars),
    defaultValues: { title: recording.title, take: recording.take, sessionId: recording.session?.id ?? null },
  });
  const { errors } = form.formState;
  const linked = recording.session;
  const known = (sessions ?? []).map(({ id, date, title, state }) => ({
    value: id,
    label: `${formatDate(date)} · ${title}`,
    note: state === 'draft' ? 'draft' : undefined,
  }));
  const send = form.handleSubmit(async (fields) => {
    try {
      await update.mutateAsync({ team, recordingId: recording.id, version: recording.version, ...fields });
      onClose();
    } catch (refused) {
      if (!(refused instanceof ApiError)) throw refused;
      for (const [name, message] of Object.entries(refused.fields))
        if (name === 'title' || name === 'take' || name === 'sessionId') form.setError(name, { message });
      form.setError('root', {
        message:
          refused.code === 'stale'
            ? 'Somebody changed these meanwhile; the page behind shows theirs. Save again to replace it with yours.'
            : refused.message,
      });
    }
  });
  return (
    <Dialog
      open
      onClose={onClose}
      title="Title, take and session"
      actions={
        <>
          <Button onClick={onClose}>Leave it</Button>
          <GoButton busy={update.isPending ? 'Saving' : undefined} onClick={() => void send()}>
            Save
          </GoButton>
        </>
      }
    >
      <form
        noValidate
        className="grid gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          void send();
        }}
      >
        <TextField label="Title" maxLength={120} error={errors.title?.message} {...form.register('title')} />
        <TextField
          label="Take"
          inputMode="numeric"
          className="w-24"
          error={errors.take?.message}
          {...form.register('take', { setValueAs: Number })}
        />
        <Controller
          control={form.control}
          name="sessionId"
          render={({ field }) => (
            <Combobox
              label="Session"
              optional
              hint="Chapters can then show its blocks, and members find the recording with it. Empty the field for none."
              options={known}
              state={isPending ? 'busy' : 'ready'}
              value={field.value}
              valueLabel={linked ? `${formatDate(linked.date)} · ${linked.title}` : ''}
              error={
                errors.sessionId?.message ?? (error ? 'The sessions did not arrive. Close and open again.' : undefined)
              }
              onChange={(id) => field.onChange(id)}
            />
          )}
        />
        {errors.root && (
          <p role="alert" className="font-bold text-danger">
            {errors.root.message}
          </p>
        )}
        <button type="submit" hidden />
      </form>
    </Dialog>
  );
}
