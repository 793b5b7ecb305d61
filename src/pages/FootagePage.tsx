import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { EmptyState } from '../components/EmptyState';
import { FileButton } from '../components/FileButton';
import { Icon } from '../components/Icon';
import { PageTitle } from '../components/PageTitle';
import { sessionQuery } from '../features/plans/api';
import { sessionsToChooseQuery } from '../features/recordings/api';
import { RecordingList } from '../features/recordings/RecordingList';
import { sessionOptions } from '../features/recordings/sessionOptions';
import { DropZone } from '../features/upload/DropZone';
import { NotTakenList } from '../features/upload/NotTakenList';
import type { SessionChoice } from '../features/upload/sendFile';
import { UploadOfRecording } from '../features/upload/UploadOfRecording';
import { UploadTo } from '../features/upload/UploadTo';
import { addFiles, type NotTaken } from '../features/upload/uploader';
import { acceptedFiles } from '../features/upload/videoFile';
import { useMay, useMe, useTeam } from '../lib/session';

/** Footage in: upload files, see them become playable, and go on to marking. */
export function FootagePage() {
  const team = useTeam().slug;
  const personId = useMe()?.id;
  const mayUpload = useMay('uploadFootage');
  const sessions = useQuery(sessionsToChooseQuery(team));
  const [{ session, asked }, choose] = useSessionChoice(team);
  const [notTaken, setNotTaken] = useState<NotTaken[]>([]);
  const take = (files: File[]) => {
    if (personId) setNotTaken(addFiles(files, { personId, team, session }));
  };
  return (
    <>
      <PageTitle
        title="Footage"
        meta={
          mayUpload && (
            <span className="max-md:hidden pointer-coarse:hidden">
              Choose files with Upload, or drop them anywhere on this page.
            </span>
          )
        }
        actions={
          mayUpload && (
            <FileButton look="go" choose="several" accept={acceptedFiles} label="Recordings to upload" onFiles={take}>
              <Icon name="upload" size={18} />
              Upload
            </FileButton>
          )
        }
      />
      {mayUpload && (
        <>
          <div className="mt-3">
            <UploadTo options={sessionOptions(sessions.data ?? [], asked)} choice={session} onChange={choose} />
          </div>
          <NotTakenList files={notTaken} onClose={() => setNotTaken([])} />
          <DropZone onFiles={take} />
        </>
      )}
      <div className="mt-5">
        <RecordingList
          team={team}
          uploadOf={({ id }) => <UploadOfRecording team={team} recordingId={id} />}
          empty={
            <EmptyState title="No footage yet.">
              Film a session in one or several takes, then choose the files with Upload or drop them anywhere on this
              page. They are made ready in the background; you can close the page once they have arrived.
            </EmptyState>
          }
        />
      </div>
    </>
  );
}

/** The choice made here, else the session that the address names: a session's own page leads here with it. */
function useSessionChoice(team: string) {
  const [address] = useSearchParams();
  const id = address.get('session');
  const { data: asked } = useQuery({ ...sessionQuery(team, id ?? ''), enabled: id !== null });
  const [chosen, choose] = useState<SessionChoice | null>(null);
  const session: SessionChoice = chosen ?? (asked ? { by: 'choice', sessionId: asked.id } : { by: 'fileDate' });
  return [{ session, asked: asked ?? null }, choose] as const;
}
