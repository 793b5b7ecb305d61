import { Progress } from '../../components/Progress';
import { useUploads } from './uploadList';
import { progressWords } from './uploadWords';

/** How far the upload of a recording is, where it comes from this page; else that it comes from elsewhere. */
export function UploadOfRecording({ team, recordingId }: { team: string; recordingId: string }) {
  const upload = useUploads(team).find((one) => one.recordingId === recordingId);
  if (!upload)
    return (
      <p className="text-sm text-ink2">
        Its file is on its way from another page or device. If that page was closed, upload the file again; this entry
        can then be removed.
      </p>
    );
  const { state, fault, arrivedBytes, sizeBytes } = upload;
  return (
    <Progress
      label={state === 'failed' ? 'The upload stopped' : 'Uploading'}
      share={state === 'sending' || state === 'queued' ? arrivedBytes / sizeBytes : null}
      state={state === 'failed' ? 'failed' : 'running'}
      note={fault ? `${fault.message} Try again at the foot of the page.` : progressWords(upload)}
    />
  );
}
