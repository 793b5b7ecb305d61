import { useState } from 'react';
import { limits } from '../../../shared/limits';
import { Button } from '../../components/Button';
import { ConfirmDialog } from '../../components/ConfirmDialog';
import { Dialog } from '../../components/Dialog';
import { FileButton } from '../../components/FileButton';
import { Icon } from '../../components/Icon';
import { announce } from '../../lib/announce';
import { ApiError } from '../../lib/api';
import { formatBytes, formatCount } from '../../lib/format';
import type { KeptDocument } from '../../lib/keptDocument';
import { currentLines, type Lines, useImportCaptions } from './api';

type Outcome = { title: string; said: string; warnings: readonly string[] };

type Props = { team: string; recordingId: string; kept: KeptDocument<Lines>; look?: 'plain' | 'go' | 'quiet' };

/** Takes the lines of a WebVTT or SRT file. A file with a fault changes nothing and says where it is. */
export function ImportCaptions({ team, recordingId, kept, look = 'quiet' }: Props) {
  const bring = useImportCaptions(team, recordingId);
  const [asked, setAsked] = useState<File | null>(null);
  const [busy, setBusy] = useState(false);
  const [outcome, setOutcome] = useState<Outcome | null>(null);
  const count = kept.current().content.length;

  const load = async (file: File) => {
    setBusy(true);
    const result = await attempt(file);
    setBusy(false);
    setAsked(null);
    if (result.warnings.length > 0 || result.title !== 'Imported') setOutcome(result);
    announce(`${result.title}. ${result.said}`);
  };
  const attempt = async (file: File): Promise<Outcome> => {
    const refused = (said: string): Outcome => ({ title: 'Nothing was changed', said, warnings: [] });
    if (file.size > limits.captionFileBytes)
      return refused(
        `“${file.name}” has ${formatBytes(file.size)}; a caption file has at most ${formatBytes(limits.captionFileBytes)}.`,
      );
    if (!(await kept.flush()))
      return refused('Your last changes are not saved yet. Save them first, so that the history keeps them.');
    try {
      const { saved, warnings } = await bring(file, kept.current().base.version);
      kept.adopt(saved);
      const lines = formatCount(saved.content.length, 'line', 'lines');
      return { title: 'Imported', said: `“${file.name}” gave ${lines}.`, warnings };
    } catch (error) {
      if (!(error instanceof ApiError)) throw error;
      const current = error.code === 'stale' ? currentLines(error.current) : null;
      if (current) kept.offer(current);
      return refused(
        current
          ? 'Somebody else saved these captions meanwhile. Theirs are shown now; import again to replace them.'
          : (Object.values(error.fields)[0] ?? error.message),
      );
    }
  };

  return (
    <>
      <FileButton
        label="Choose a caption file"
        accept=".vtt,.srt,text/vtt,application/x-subrip"
        size="small"
        look={look}
        busy={busy && !asked ? 'Importing' : undefined}
        onFiles={([file]) => {
          if (!file) return;
          if (count > 0) setAsked(file);
          else void load(file);
        }}
      >
        <Icon name="upload" size={16} /> Import WebVTT or SRT
      </FileButton>
      <ConfirmDialog
        open={asked !== null}
        title={`Replace ${formatCount(count, 'line', 'lines')}?`}
        confirm="Replace"
        busy={busy ? 'Importing' : undefined}
        onConfirm={() => asked && void load(asked)}
        onClose={() => setAsked(null)}
      >
        The lines of “{asked?.name}” take their place. The present ones stay in the history.
      </ConfirmDialog>
      <Dialog
        open={outcome !== null}
        onClose={() => setOutcome(null)}
        title={outcome?.title ?? ''}
        actions={
          <Button data-first-focus onClick={() => setOutcome(null)}>
            Close
          </Button>
        }
      >
        <p>{outcome?.said}</p>
        {outcome && outcome.warnings.length > 0 && (
          <>
            <p className="mt-3 font-bold">Worth a look:</p>
            <ul className="mt-1 list-disc ps-5 text-sm">
              {outcome.warnings.map((warning) => (
                <li key={warning}>{warning}</li>
              ))}
            </ul>
          </>
        )}
      </Dialog>
    </>
  );
}
