import { type QueryClient, useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import type { LiveEvent } from '../../../shared/contracts/live';
import type { Recording } from '../../../shared/contracts/recordings';
import { announce } from '../../lib/announce';
import { useMe } from '../../lib/session';
import { changeRecording, forgetRecording, recordingsQuery } from './api';
import { isInMotion, withStep } from './liveChanges';
import { openLiveStream } from './liveStream';
import { soon } from './soon';

/** Keeps what the team's pages show fresh while the worker makes things and others save. */
export function LiveUpdates({ team }: { team: string }) {
  const queries = useQueryClient();
  const me = useMe()?.id;
  useEffect(() => {
    if (!me) return;
    const refresh = soon(() => queries.invalidateQueries({ queryKey: ['recordings', team] }));
    const close = openLiveStream(team, {
      onEvent: (event) => take(event, { queries, team, me, refresh: refresh.ask }),
      onOpen: (time) => {
        if (time === 'again' || shownRecordings(queries, team).some(isInMotion)) refresh.ask();
        if (time === 'first') return;
        for (const document of ['chapters', 'cues', 'captions'])
          void queries.invalidateQueries({ queryKey: [document, team] });
      },
      onSilence: () => {
        if (shownRecordings(queries, team).some(isInMotion)) refresh.ask();
      },
    });
    return () => {
      close();
      refresh.stop();
    };
  }, [queries, team, me]);
  return null;
}

type Place = { queries: QueryClient; team: string; me: string; refresh: () => void };

function take(event: LiveEvent, { queries, team, me, refresh }: Place): void {
  const { recordingId } = event;
  if (event.type === 'step') {
    const known = changeRecording(queries, team, recordingId, (recording) => withStep(recording, event));
    // its result, such as the still, comes with the recording
    if (!known || event.state === 'done' || event.state === 'failed') refresh();
  } else if (event.type === 'recording') {
    tellOfChange(event, queries, team);
    changeRecording(queries, team, recordingId, (recording) => ({ ...recording, state: event.state }));
    refresh();
    void queries.invalidateQueries({ queryKey: ['sessions', team] });
  } else if (event.type === 'removed') {
    forgetRecording(queries, team, recordingId);
    refresh();
  } else if (event.by !== me) {
    void queries.invalidateQueries({ queryKey: [event.document, team, recordingId] });
    refresh();
  }
}

function tellOfChange(event: Extract<LiveEvent, { type: 'recording' }>, queries: QueryClient, team: string): void {
  const recording = shownRecordings(queries, team).find(({ id }) => id === event.recordingId);
  if (!recording || recording.state === event.state) return;
  if (event.state === 'ready') announce(`“${recording.title}” is ready to watch and to mark.`);
  if (event.state === 'failed') announce(`“${recording.title}” cannot be shown.`);
}

function shownRecordings(queries: QueryClient, team: string): Recording[] {
  const listed = queries.getQueryData(recordingsQuery(team).queryKey)?.pages.flatMap((page) => page.items) ?? [];
  const single = queries.getQueriesData({ queryKey: ['recordings', team] }).map(([, data]) => data);
  return [...listed, ...single.filter(isRecording)];
}

const isRecording = (data: unknown): data is Recording =>
  typeof data === 'object' && data !== null && 'steps' in data && 'posterUrl' in data;
