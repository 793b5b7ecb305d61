import { useState } from 'react';
import { type Movement, setMovementPicture } from '../../../shared/contracts/movements';
import { limits } from '../../../shared/limits';
import { Button } from '../../components/Button';
import { ConfirmDialog } from '../../components/ConfirmDialog';
import { FileButton } from '../../components/FileButton';
import { FormFault } from '../../components/FormFault';
import { Still } from '../../components/Still';
import { announce } from '../../lib/announce';
import { useRemovePicture, useSetPicture } from './api';

const { pictureBytes: mostBytes } = limits;

/** The movement's own picture, kept as soon as it is chosen. */
export function MovementPicture({ team, movement }: { team: string; movement: Movement }) {
  const set = useSetPicture(team, movement.id);
  const remove = useRemovePicture(team, movement.id);
  const [asked, setAsked] = useState(false);
  const [tooLarge, setTooLarge] = useState(false);
  const choose = (file: File) => {
    // the server says so too, but a browser that is still sending may not hear it
    setTooLarge(file.size > mostBytes);
    if (file.size > mostBytes) return set.reset();
    set.mutate(file, { onSuccess: () => announce('The picture is kept') });
  };
  const { name, pictureUrl } = movement;
  return (
    <div className="max-w-88">
      <Still src={pictureUrl} alt={name} className="w-full" />
      <div className="mt-2 flex flex-wrap gap-2">
        <FileButton
          label={`Choose a picture of ${name}`}
          accept={setMovementPicture.file?.types.join()}
          size="small"
          busy={set.isPending ? 'Sending' : undefined}
          onFiles={([file]) => file && choose(file)}
        >
          {pictureUrl ? 'Change the picture' : 'Choose a picture'}
        </FileButton>
        {pictureUrl && (
          <Button size="small" look="quiet" onClick={() => setAsked(true)}>
            Remove it
          </Button>
        )}
      </div>
      <p className="mt-1.5 text-sm text-ink2">
        {pictureUrl ? 'Saved by itself.' : 'Without one, members see the newest demo’s, once there is one.'}
      </p>
      <FormFault>
        {tooLarge ? `At most ${mostBytes / 1024 / 1024} MB fit here. Choose a smaller file.` : set.error?.message}
      </FormFault>
      <ConfirmDialog
        open={asked}
        title={`Remove the picture of ${name}?`}
        confirm="Remove it"
        busy={remove.isPending ? 'Removing' : undefined}
        error={remove.error?.message}
        onConfirm={() =>
          remove.mutate(undefined, {
            onSuccess: () => {
              set.reset();
              setAsked(false);
              announce('The picture was removed');
            },
          })
        }
        onClose={() => setAsked(false)}
      >
        It can’t be brought back; you can choose another one.
      </ConfirmDialog>
    </div>
  );
}
