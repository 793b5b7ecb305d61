import { LiveEvent, live } from '../../../shared/contracts/live';
import { addressOf } from '../../lib/api';

type Listener = {
  onEvent: (event: LiveEvent) => void;
  /** `again` after a time in which nothing was heard: what was told meanwhile is lost */
  onOpen: (time: 'first' | 'again') => void;
  /** called from time to time while there is no stream */
  onSilence: () => void;
};

/** A browser that gets an answer other than a stream does not try again by itself; this does. */
const againMs = { first: 2000, longest: 30_000 } as const;
const pollMs = 5000;
/** A browser opens six connections to one address: a page in the background gives its own back. */
const hiddenMs = 60_000;

/** Listens to a team's events until it is closed, through lost connections and servers that start anew. */
export function openLiveStream(team: string, { onEvent, onOpen, onSilence }: Listener): () => void {
  let source: EventSource | null = null;
  let failed = 0;
  let time: 'first' | 'again' = 'first';
  let again: ReturnType<typeof setTimeout> | undefined;
  let hide: ReturnType<typeof setTimeout> | undefined;

  const close = () => {
    source?.close();
    source = null;
    clearTimeout(again);
  };
  const open = () => {
    close();
    source = new EventSource(addressOf(live, { team }));
    source.onopen = () => {
      failed = 0;
      onOpen(time);
      time = 'again';
    };
    source.onmessage = ({ data }) => {
      const read = readEvent(data);
      if (read) onEvent(read);
    };
    source.onerror = () => {
      if (source?.readyState !== EventSource.CLOSED) return;
      const wait = Math.min(againMs.longest, againMs.first * 2 ** failed++);
      again = setTimeout(open, wait * (0.5 + Math.random() / 2));
    };
  };
  const poll = setInterval(() => {
    if (document.visibilityState === 'visible' && source?.readyState !== EventSource.OPEN) onSilence();
  }, pollMs);
  const look = () => {
    clearTimeout(hide);
    if (document.visibilityState === 'hidden') hide = setTimeout(close, hiddenMs);
    else if (source === null) open();
  };

  document.addEventListener('visibilitychange', look);
  open();
  return () => {
    document.removeEventListener('visibilitychange', look);
    clearTimeout(hide);
    clearInterval(poll);
    close();
  };
}

/** What an older or newer server tells, and this page does not know, is passed over. */
function readEvent(data: unknown): LiveEvent | null {
  try {
    const read = LiveEvent.safeParse(JSON.parse(String(data)));
    return read.success ? read.data : null;
  } catch {
    return null;
  }
}
