import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useMemo, useRef } from 'react';
import type { Chapters } from '../../../shared/contracts/marks';
import type { Chapter } from '../../../shared/domain/chapters/chapter';
import { tell } from '../../components/toasts';
import type { KeptDocument } from '../../lib/keptDocument';
import { useDocument, useSnapshot } from '../../lib/useDocument';
import { asDocument, chaptersQuery, useChapterSource } from './api';
import { refusalOf, rowFaults } from './rowFaults';

type About = { team: string; recordingId: string; person: string };
/** What faults depend on besides the chapters. */
type Ground = { durationMs: number | null; blockIds: ReadonlySet<string> | null; sessionId: string | null };

/** A recording's chapters as a document that saves itself, and what is wrong with each of them. */
export function useChapters(about: About, loaded: Chapters, ground: Ground) {
  const latest = useRef(ground);
  latest.current = ground;
  const source = useChapterSource(about, (chapters) =>
    refusalOf(rowFaults(chapters, latest.current.durationMs, latest.current.blockIds)),
  );
  const saved = useMemo(() => asDocument(loaded), [loaded]);
  const kept: KeptDocument<readonly Chapter[]> = useDocument(saved, source, () =>
    tell('Somebody else saved these chapters. Theirs are shown now.'),
  );
  const snapshot = useSnapshot(kept);
  useSessionChange(about, ground.sessionId);
  const faults = useMemo(
    () => rowFaults(snapshot.content, ground.durationMs, ground.blockIds),
    [snapshot.content, ground.durationMs, ground.blockIds],
  );
  return { kept, snapshot, faults };
}

/** In another session the chapters have lost the blocks that they showed: they are asked for again. */
function useSessionChange({ team, recordingId }: About, sessionId: string | null): void {
  const queries = useQueryClient();
  const before = useRef(sessionId);
  useEffect(() => {
    if (before.current === sessionId) return;
    before.current = sessionId;
    void queries.invalidateQueries({ queryKey: chaptersQuery(team, recordingId).queryKey, exact: true });
  }, [queries, team, recordingId, sessionId]);
}
