import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useLayoutEffect, useRef, useState } from 'react';
import { Button } from '../../components/Button';
import { Icon } from '../../components/Icon';
import { formatShare } from '../../lib/format';
import { useMe } from '../../lib/session';
import { useAnnounceUploads } from './announceUploads';
import { UploadRow } from './UploadRow';
import { dismissUploads, keepOnlyUploadsOf } from './uploader';
import { isUnderWay, type Upload, useUploads } from './uploadList';
import { shareOf, summaryOf } from './uploadWords';

const foldId = 'uploads-fold';

/** At the foot of the desk while something is on its way, stopped, or has just arrived. */
export function UploadTray({ team }: { team: string }) {
  const personId = useMe()?.id;
  const uploads = useUploads(team);
  useEffect(() => {
    if (personId) keepOnlyUploadsOf(personId);
  }, [personId]);
  useFreshRecordings(team, uploads);
  useAnnounceUploads(uploads);
  useFocusAfterRow(uploads.length);
  return uploads.length > 0 ? <OpenTray uploads={uploads} /> : null;
}

function OpenTray({ uploads }: { uploads: readonly Upload[] }) {
  const tray = useRef<HTMLElement>(null);
  const [chosen, setChosen] = useState<'shown' | 'hidden' | null>(null);
  const height = useRoomAtFoot(tray);
  const underWay = uploads.filter(isUnderWay);
  const done = uploads.filter((upload) => upload.state === 'done');
  const rows = chosen ?? ownRows(uploads);
  return (
    <>
      {/* the page ends above the tray, so that its last lines can be scrolled clear of it */}
      <div aria-hidden="true" style={{ height }} />
      <section
        ref={tray}
        aria-label="Uploads"
        className="fixed inset-x-0 bottom-0 z-30 border-t-thin border-edge bg-surface px-4 pb-[env(safe-area-inset-bottom,0px)] md:px-[max(1.25rem,calc(50%-58.75rem))]"
      >
        <div className="flex min-h-11 items-center gap-2 py-1">
          <h2 className="min-w-0 grow text-sm font-extrabold">
            {summaryOf(uploads)}
            {underWay.length > 0 && <span className="ms-2">{formatShare(shareOf(underWay))}</span>}
          </h2>
          {underWay.length === 0 && done.length > 0 && (
            <Button size="small" look="quiet" onClick={() => dismissUploads(done.map(({ id }) => id))}>
              Clear
            </Button>
          )}
          <Button
            size="small"
            look="quiet"
            id={foldId}
            aria-expanded={rows === 'shown'}
            onClick={() => setChosen(rows === 'shown' ? 'hidden' : 'shown')}
          >
            {rows === 'shown' ? 'Fold' : 'Show'}
            <Icon name="chevron" size={14} className={rows === 'shown' ? '' : 'rotate-180'} />
          </Button>
        </div>
        {rows === 'shown' && (
          <ul className="max-h-[min(40dvh,22rem)] gap-x-10 overflow-y-auto overscroll-contain pb-1 md:grid md:grid-cols-2 2xl:grid-cols-3">
            {uploads.map((upload) => (
              <UploadRow key={upload.id} upload={upload} />
            ))}
          </ul>
        )}
      </section>
    </>
  );
}

/** What nobody has to look at is folded by itself: many files on a phone, and what has all arrived. */
function ownRows(uploads: readonly Upload[]): 'shown' | 'hidden' {
  if (uploads.length <= 1 || uploads.some((upload) => upload.state === 'failed')) return 'shown';
  return uploads.some(isUnderWay) && window.matchMedia('(width >= 48rem)').matches ? 'shown' : 'hidden';
}

/** Tells the page how high the tray is: toasts, sticky actions and what gets the focus keep clear of it through `--nav`. */
function useRoomAtFoot(tray: { current: HTMLElement | null }): number {
  const [height, setHeight] = useState(0);
  useLayoutEffect(() => {
    const element = tray.current;
    if (!element) return;
    const root = document.documentElement;
    const watcher = new ResizeObserver(() => {
      setHeight(element.offsetHeight);
      root.style.setProperty('--nav', `${element.offsetHeight}px`);
    });
    watcher.observe(element);
    return () => {
      watcher.disconnect();
      root.style.removeProperty('--nav');
    };
  }, [tray]);
  return height;
}

/** A row that goes takes the focus with it: it moves to the tray's own button, and from the last row to the page. */
function useFocusAfterRow(count: number): void {
  const last = useRef(count);
  useEffect(() => {
    const isFewer = count < last.current;
    last.current = count;
    if (!isFewer || document.activeElement !== document.body) return;
    const next = document.getElementById(foldId) ?? document.getElementById('main');
    next?.focus({ preventScroll: true });
  }, [count]);
}

/** A recording that was announced, has arrived or was taken back changes what the pages list. */
function useFreshRecordings(team: string, uploads: readonly Upload[]): void {
  const queries = useQueryClient();
  const known = uploads.map(({ recordingId, state }) => `${recordingId ?? ''} ${state === 'done'}`).join();
  const last = useRef(known);
  useEffect(() => {
    if (last.current === known) return;
    last.current = known;
    void queries.invalidateQueries({ queryKey: ['recordings', team] });
  }, [known, queries, team]);
}
