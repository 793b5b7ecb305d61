import type { Recording } from '../../../shared/contracts/recordings';
import { ConfirmDialog } from '../../components/ConfirmDialog';
import { announce } from '../../lib/announce';
import { formatCount, formatList } from '../../lib/format';
import { useRemoveRecording } from './api';

type Props = { team: string; recording: Recording; onClose: () => void };

/** Asks once, and says what goes with it. */
export function RemoveRecording({ team, recording, onClose }: Props) {
  const remove = useRemoveRecording(team);
  const { id, title, chapterCount, captionLineCount, session } = recording;
  const marks = [
    ...(chapterCount > 0 ? [formatCount(chapterCount, 'chapter', 'chapters')] : []),
    ...(captionLineCount > 0 ? [formatCount(captionLineCount, 'caption line', 'caption lines')] : []),
  ];
  const confirm = async () => {
    try {
      await remove.mutateAsync(id);
    } catch {
      // said in the window
      return;
    }
    announce(`“${title}” is removed.`);
    onClose();
    // its row, and the button that had the focus, are gone
    document.getElementById('main')?.focus({ preventScroll: true });
  };
  return (
    <ConfirmDialog
      open
      title={`Remove “${title}”?`}
      confirm="Remove it"
      busy={remove.isPending ? 'Removing' : undefined}
      error={remove.error?.message}
      onClose={onClose}
      onConfirm={() => void confirm()}
    >
      <p>
        The file and everything made from it go{marks.length > 0 && `, with ${formatList(marks)} and their cues`}. This
        cannot be undone.
      </p>
      {session?.state === 'published' && (
        <p className="mt-2 font-bold">Members watch it in “{session.title}”; it goes from there too.</p>
      )}
    </ConfirmDialog>
  );
}
