import { useSyncExternalStore } from 'react';

/** What people see of an upload. The list lives outside of React, so that it outlives the page it was started from. */
export type Upload = {
  /** the request's key: one for every picked file, so that a double click makes one upload */
  id: string;
  /** whose it is: nobody sees the last person's after a change of person */
  personId: string;
  team: string;
  fileName: string;
  sizeBytes: number;
  /** `finishing` all bytes are there and are put together */
  state: 'queued' | 'sending' | 'finishing' | 'done' | 'failed' | 'cancelling';
  arrivedBytes: number;
  bytesPerSecond: number | null;
  /** the device has no connection; it goes on by itself */
  connection: 'there' | 'awaited';
  /** known once the server was told of the file */
  recordingId: string | null;
  /** what went wrong, in a sentence; `again` where another try may help */
  fault: { message: string; again: boolean } | null;
};

let uploads: readonly Upload[] = [];
const listeners = new Set<() => void>();

function publish(next: readonly Upload[]): void {
  uploads = next;
  for (const listener of listeners) listener();
}

export const currentUploads = (): readonly Upload[] => uploads;

export const uploadOf = (id: string): Upload | undefined => uploads.find((upload) => upload.id === id);

export const addUploads = (added: readonly Upload[]): void => publish([...uploads, ...added]);

export function changeUpload(id: string, change: Partial<Upload>): void {
  if (uploadOf(id)) publish(uploads.map((upload) => (upload.id === id ? { ...upload, ...change } : upload)));
}

export const dropUploads = (ids: readonly string[]): void =>
  publish(uploads.filter((upload) => !ids.includes(upload.id)));

export function subscribeToUploads(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** Bytes are on their way, or about to be: leaving the site would end it. */
export const isUnderWay = ({ state }: Upload): boolean => state !== 'done' && state !== 'failed';

/** A team's uploads, in the order in which they were chosen. */
export function useUploads(team: string): readonly Upload[] {
  return useSyncExternalStore(subscribeToUploads, currentUploads).filter((upload) => upload.team === team);
}
