import { formatBytes, formatCount, formatSpan } from '../../lib/format';
import { timeLeftMs } from './speed';
import { isUnderWay, type Upload } from './uploadList';

/** An upload in a line: how much has arrived, how fast, how long it will still take. */
export function progressWords(upload: Upload): string {
  const { state, connection, arrivedBytes, sizeBytes, bytesPerSecond } = upload;
  const amount = `${formatBytes(arrivedBytes)} of ${formatBytes(sizeBytes)}`;
  if (state === 'cancelling') return 'Taking back what was sent';
  if (connection === 'awaited') return `${amount} · no connection; it goes on when there is one`;
  if (state === 'queued') return `${formatBytes(sizeBytes)} · waits for the files before it`;
  if (state === 'finishing') return 'All of it has arrived; putting it together';
  const leftMs = timeLeftMs(sizeBytes - arrivedBytes, bytesPerSecond);
  if (bytesPerSecond === null || leftMs === null) return amount;
  return `${amount} · ${formatBytes(bytesPerSecond)} a second · about ${formatSpan(Math.max(1000, leftMs))} left`;
}

/** Between 0 and 1, over all that are under way. */
export function shareOf(uploads: readonly Upload[]): number {
  const whole = uploads.reduce((sum, upload) => sum + upload.sizeBytes, 0);
  const arrived = uploads.reduce((sum, upload) => sum + upload.arrivedBytes, 0);
  return whole === 0 ? 0 : arrived / whole;
}

/** The tray's heading: what is under way, or what is left to look at. */
export function summaryOf(uploads: readonly Upload[]): string {
  const count = (some: readonly Upload[]) => formatCount(some.length, 'file', 'files');
  const underWay = uploads.filter(isUnderWay);
  const failed = uploads.filter((upload) => upload.state === 'failed');
  const stopped = failed.length > 0 ? `${count(failed)} stopped` : '';
  if (underWay.length > 0) return [`Uploading ${count(underWay)}`, stopped].filter(Boolean).join(', ');
  return stopped || `${count(uploads)} uploaded`;
}
