import { useEffect, useRef, useState, useSyncExternalStore } from 'react';
import { type DocumentSnapshot, type DocumentSource, KeptDocument, type Saved } from './keptDocument';

/**
 * Keeps a document for as long as its page is open. A component that uses it is keyed by the recording.
 * @param saved what the server has; a newer one is taken over when nothing is unsaved
 * @param onNewer called when somebody else's version was taken over
 */
export function useDocument<T>(saved: Saved<T>, source: DocumentSource<T>, onNewer: () => void): KeptDocument<T> {
  const [kept] = useState(() => new KeptDocument(saved, source));
  const newer = useRef(onNewer);
  useEffect(() => {
    newer.current = onNewer;
  });
  useEffect(() => kept.open(), [kept]);
  useEffect(() => {
    if (kept.offer(saved)) newer.current();
  }, [kept, saved]);
  return kept;
}

export function useSnapshot<T>(kept: KeptDocument<T>): DocumentSnapshot<T> {
  return useSyncExternalStore(kept.subscribe, kept.current);
}

export type OpenDialog = 'none' | 'history' | 'compare';

/** Which of a document's dialogs is open; the comparison opens by itself when somebody else was faster. */
export function useDocumentDialog(save: { is: string }): [OpenDialog, (next: OpenDialog) => void] {
  const isStale = save.is === 'stale';
  const [open, setOpen] = useState<OpenDialog>('none');
  const [was, setWas] = useState(false);
  if (was !== isStale) {
    setWas(isStale);
    setOpen(isStale ? 'compare' : 'none');
  }
  return [open, setOpen];
}
