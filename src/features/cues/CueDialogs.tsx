import { formatMsWithTenths } from '../../../shared/domain/timecode';
import { DocumentDialogs } from '../../components/DocumentDialogs';
import type { KeptDocument } from '../../lib/keptDocument';
import type { OpenDialog } from '../../lib/useDocument';
import { type CueList, cueVersionsQuery, useRestoreCues } from './api';
import { compareCueVersions, sortCues } from './editCues';

type Props = {
  team: string;
  recordingId: string;
  kept: KeptDocument<CueList>;
  names: ReadonlyMap<string, string>;
  open: OpenDialog;
  onClose: () => void;
};

export function CueDialogs({ team, recordingId, kept, names, open, onClose }: Props) {
  return (
    <DocumentDialogs
      {...{ kept, open, onClose }}
      one="cue"
      many="cues"
      versions={cueVersionsQuery(team, recordingId)}
      restore={useRestoreCues(team, recordingId)}
      compare={compareCueVersions}
      order={sortCues}
      show={({ atMs, kind, text, movementId }) => (
        <>
          {formatMsWithTenths(atMs)} · {kind} · <b>{text}</b>
          {movementId && ` · ${names.get(movementId) ?? 'another movement'}`}
        </>
      )}
    />
  );
}
