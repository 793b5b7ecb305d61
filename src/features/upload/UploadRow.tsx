import { Button, ButtonLink } from '../../components/Button';
import { IconButton } from '../../components/IconButton';
import { Progress } from '../../components/Progress';
import { formatBytes } from '../../lib/format';
import { teamPath } from '../../lib/session';
import { cancelUpload, dismissUploads, tryAgain } from './uploader';
import type { Upload } from './uploadList';
import { progressWords } from './uploadWords';

/** One file on its way, stopped, or arrived. */
export function UploadRow({ upload }: { upload: Upload }) {
  return (
    <li className="flex flex-wrap items-center gap-x-4 gap-y-1 border-t border-line py-2">
      <div className="min-w-0 grow basis-40">
        <UploadWords upload={upload} />
      </div>
      <div className="ms-auto flex flex-none items-center gap-2">
        <UploadActions upload={upload} />
      </div>
    </li>
  );
}

function UploadWords({ upload }: { upload: Upload }) {
  const { fileName, sizeBytes, arrivedBytes, state, fault } = upload;
  if (state === 'done')
    return (
      <div className="text-sm">
        <p className="font-bold wrap-anywhere">{fileName}</p>
        <p className="text-ink2">{formatBytes(sizeBytes)} · uploaded</p>
      </div>
    );
  return (
    <Progress
      label={fileName}
      share={state === 'cancelling' || state === 'finishing' ? null : arrivedBytes / sizeBytes}
      state={state === 'failed' ? 'failed' : 'running'}
      note={fault?.message ?? progressWords(upload)}
    />
  );
}

function UploadActions({ upload: { id, team, fileName, recordingId, state, fault } }: { upload: Upload }) {
  if (state === 'cancelling') return null;
  if (state === 'done')
    return (
      <>
        {recordingId && (
          <ButtonLink size="small" to={teamPath(team, 'footage', recordingId)} aria-label={`Open ${fileName}`}>
            Open
          </ButtonLink>
        )}
        <IconButton
          icon="close"
          label={`Take ${fileName} off this list`}
          look="quiet"
          size="small"
          onClick={() => dismissUploads([id])}
        />
      </>
    );
  return (
    <>
      {fault?.again && (
        <Button size="small" onClick={() => tryAgain(id)} aria-label={`Try again: ${fileName}`}>
          Try again
        </Button>
      )}
      <Button size="small" look="quiet" onClick={() => void cancelUpload(id)} aria-label={`Cancel ${fileName}`}>
        Cancel
      </Button>
    </>
  );
}
