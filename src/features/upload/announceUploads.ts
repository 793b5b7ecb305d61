import { useEffect, useRef } from 'react';
import { announce } from '../../lib/announce';
import type { Upload } from './uploadList';

/** Says politely what became of an upload; how far it is can be read from its bar. */
export function useAnnounceUploads(uploads: readonly Upload[]): void {
  const states = useRef(new Map<string, Upload['state']>());
  useEffect(() => {
    const before = states.current;
    const said = uploads.flatMap((upload) => {
      const was = before.get(upload.id);
      return was === upload.state ? [] : [newsOf(upload, was)];
    });
    states.current = new Map(uploads.map((upload) => [upload.id, upload.state]));
    const news = said.filter(Boolean).join(' ');
    if (news) announce(news);
  }, [uploads]);
}

function newsOf({ state, fileName, fault }: Upload, was: Upload['state'] | undefined): string {
  if (was === undefined) return state === 'done' || state === 'failed' ? '' : `Uploading ${fileName}.`;
  if (state === 'done') return `${fileName} is uploaded.`;
  if (state === 'failed') return `${fileName} stopped. ${fault?.message ?? ''}`;
  if (state === 'cancelling') return `Cancelling ${fileName}.`;
  return '';
}
