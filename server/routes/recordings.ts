import {
  getRecording,
  listRecordings,
  removeRecording,
  retryMaking,
  updateRecording,
} from '../../shared/contracts/recordings';
import { presentRecording, presentRecordings } from '../services/recordingPresent';
import * as recordings from '../services/recordings';
import { on, type Route } from './on';

export const recordingRoutes: Route[] = [
  on(listRecordings, async ({ actor, query }) => {
    const { items, nextCursor } = await recordings.listRecordings(actor, query);
    return { items: await presentRecordings(actor.team.id, items), nextCursor };
  }),
  on(getRecording, async ({ actor, params }) =>
    presentRecording(actor.team.id, await recordings.getRecording(actor, params.recordingId)),
  ),
  on(updateRecording, async ({ actor, params, body }) =>
    presentRecording(actor.team.id, await recordings.updateRecording(actor, params.recordingId, body)),
  ),
  on(retryMaking, async ({ actor, params }) =>
    presentRecording(actor.team.id, await recordings.retryMaking(actor, params.recordingId)),
  ),
  on(removeRecording, async ({ actor, params }) => {
    await recordings.removeRecording(actor, params.recordingId);
    return {};
  }),
];
