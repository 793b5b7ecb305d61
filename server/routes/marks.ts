import * as contract from '../../shared/contracts/marks';
import { writeChaptersWebvtt, writeWebvtt } from '../../shared/domain/captions/writeWebvtt';
import * as captions from '../services/captions';
import * as chapters from '../services/chapters';
import * as cues from '../services/cues';
import { on, type Route } from './on';

export const markRoutes: Route[] = [
  on(contract.getChapters, ({ actor, params }) => chapters.read(actor, params.recordingId)),
  on(contract.saveChapters, ({ actor, params, body }) =>
    chapters.save(actor, params.recordingId, body.version, body.items),
  ),
  on(contract.listChapterVersions, async ({ actor, params }) => ({
    items: await chapters.versions(actor, params.recordingId),
  })),
  on(contract.restoreChapters, ({ actor, params, body }) =>
    chapters.restore(actor, params.recordingId, body.restore, body.version),
  ),
  on(contract.exportChapters, async ({ actor, params }) =>
    writeChaptersWebvtt(await chapters.forExport(actor, params.recordingId)),
  ),

  on(contract.getCues, ({ actor, params }) => cues.read(actor, params.recordingId)),
  on(contract.saveCues, ({ actor, params, body }) => cues.save(actor, params.recordingId, body.version, body.items)),
  on(contract.listCueVersions, async ({ actor, params }) => ({
    items: await cues.versions(actor, params.recordingId),
  })),
  on(contract.restoreCues, ({ actor, params, body }) =>
    cues.restore(actor, params.recordingId, body.restore, body.version),
  ),

  on(contract.getCaptions, ({ actor, params }) => captions.read(actor, params.recordingId)),
  on(contract.saveCaptions, ({ actor, params, body }) =>
    captions.save(actor, params.recordingId, body.version, body.lines),
  ),
  on(contract.importCaptions, ({ actor, params, body, file }) =>
    captions.importFile(actor, params.recordingId, body.version, file),
  ),
  on(contract.listCaptionVersions, async ({ actor, params }) => ({
    items: await captions.versions(actor, params.recordingId),
  })),
  on(contract.restoreCaptions, ({ actor, params, body }) =>
    captions.restore(actor, params.recordingId, body.restore, body.version),
  ),
  on(contract.exportCaptions, async ({ actor, params }) =>
    writeWebvtt(await captions.forExport(actor, params.recordingId)),
  ),
];
