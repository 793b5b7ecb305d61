import { Skeleton, SkeletonRows } from '../../components/Skeleton';
import './watch.css';

/** The shape of the page while what it needs is on its way. */
export function WatchSkeleton() {
  return (
    <div className="watch gap-y-4">
      <div className="watch-main">
        <div className="stage">
          <div className="picture aspect-video" />
          <div className="stage-controls shown-late py-4">
            <Skeleton className="h-3.5" />
          </div>
        </div>
      </div>
      <div className="watch-side">
        <div className="watch-lists">
          <SkeletonRows label="Recording" count={6} />
        </div>
      </div>
    </div>
  );
}
