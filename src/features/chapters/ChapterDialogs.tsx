import type { Chapter } from '../../../shared/domain/chapters/chapter';
import { sortChapters } from '../../../shared/domain/chapters/chapterRules';
import { compareChapterVersions } from '../../../shared/domain/chapters/compareVersions';
import { formatMsWithTenths } from '../../../shared/domain/timecode';
import { DocumentDialogs } from '../../components/DocumentDialogs';
import type { KeptDocument } from '../../lib/keptDocument';
import type { OpenDialog } from '../../lib/useDocument';
import { chapterVersionsQuery, useRestoreChapters } from './api';
import { kindNames, type Names } from './chapterNames';

type Props = {
  team: string;
  recordingId: string;
  kept: KeptDocument<readonly Chapter[]>;
  names: Names;
  open: OpenDialog;
  onClose: () => void;
};

export function ChapterDialogs({ team, recordingId, kept, names, open, onClose }: Props) {
  return (
    <DocumentDialogs
      {...{ kept, open, onClose }}
      one="chapter"
      many="chapters"
      versions={chapterVersionsQuery(team, recordingId)}
      restore={useRestoreChapters(team, recordingId)}
      compare={compareChapterVersions}
      order={sortChapters}
      show={(chapter) => <ChapterText chapter={chapter} names={names} />}
    />
  );
}

function ChapterText({ chapter, names }: { chapter: Chapter; names: Names }) {
  const movement = chapter.movementId && names.get(chapter.movementId);
  return (
    <>
      {formatMsWithTenths(chapter.startMs)} to {formatMsWithTenths(chapter.endMs)} · {kindNames[chapter.kind]} ·{' '}
      <b>{chapter.title}</b>
      {movement && movement !== chapter.title && ` · shows ${movement}`}
      {chapter.note && <span className="block">{chapter.note}</span>}
    </>
  );
}
