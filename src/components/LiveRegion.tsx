import { useAnnouncement } from '../lib/announce';

/** Once in the application: reads out what `announce` is given. */
export function LiveRegion() {
  const { text, count } = useAnnouncement();
  return (
    <div role="status" aria-live="polite" aria-atomic="true" className="sr-only">
      {/* a new element each time, so that the same sentence is read again */}
      <span key={count}>{text}</span>
    </div>
  );
}
