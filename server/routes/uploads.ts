import {
  abortUpload,
  completeUpload,
  createUpload,
  getUpload,
  reportPart,
  signPart,
} from '../../shared/contracts/recordings';
import { presentRecording } from '../services/recordingPresent';
import * as uploads from '../services/uploads';
import { on, type Route } from './on';

export const uploadRoutes: Route[] = [
  on(createUpload, async ({ actor, body }) => uploads.presentUpload(await uploads.createUpload(actor, body))),
  on(getUpload, async ({ actor, params }) => uploads.presentUpload(await uploads.getUpload(actor, params.uploadId))),
  on(signPart, ({ actor, params, body }) => uploads.signPart(actor, params.uploadId, body)),
  on(reportPart, async ({ actor, params, body }) => {
    await uploads.reportPart(actor, params.uploadId, body);
    return {};
  }),
  on(completeUpload, async ({ actor, params }) =>
    presentRecording(actor.team.id, await uploads.completeUpload(actor, params.uploadId)),
  ),
  on(abortUpload, async ({ actor, params }) => {
    await uploads.abortUpload(actor, params.uploadId);
    return {};
  }),
];
