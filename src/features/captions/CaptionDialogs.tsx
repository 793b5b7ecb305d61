import { inOrder } from '../../../shared/domain/captions/captionFaults';
import { compareLineVersions } from '../../../shared/domain/captions/compareVersions';
import { formatMsWithTenths } from '../../../shared/domain/timecode';
import { DocumentDialogs } from '../../components/DocumentDialogs';
import type { KeptDocument } from '../../lib/keptDocument';
import type { OpenDialog } from '../../lib/useDocument';
import { captionVersionsQuery, type Lines, useRestoreCaptions } from './api';

type Props = {
  team: string;
  recordingId: string;
  kept: KeptDocument<Lines>;
  open: OpenDialog;
  onClose: () => void;
};

export function CaptionDialogs({ team, recordingId, kept, open, onClose }: Props) {
  return (
    <DocumentDialogs
      {...{ kept, open, onClose }}
      one="caption line"
      many="caption lines"
      versions={captionVersionsQuery(team, recordingId)}
      restore={useRestoreCaptions(team, recordingId)}
      compare={compareLineVersions}
      order={inOrder}
      show={({ startMs, endMs, text }) => (
        <>
          {formatMsWithTenths(startMs)} to {formatMsWithTenths(endMs)}
          <span className="block font-bold whitespace-pre-line">{text}</span>
        </>
      )}
    />
  );
}
