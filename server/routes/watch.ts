import { getWatch, keepPlace } from '../../shared/contracts/watch';
import * as watch from '../services/watch';
import { on, type Route } from './on';

export const watchRoutes: Route[] = [
  on(getWatch, ({ actor, params }) => watch.getWatch(actor, params.recordingId)),
  on(keepPlace, async ({ actor, params, body }) => {
    await watch.keepPlace(actor, params.recordingId, body.atMs);
    return {};
  }),
];
