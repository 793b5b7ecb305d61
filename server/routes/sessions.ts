import * as contract from '../../shared/contracts/sessions';
import { myDay } from '../services/myDay';
import * as publishing from '../services/publishing';
import * as sessions from '../services/sessions';
import { on, type Route } from './on';

export const sessionRoutes: Route[] = [
  on(contract.listSessions, ({ actor, query }) => sessions.list(actor, query)),
  on(contract.getSession, ({ actor, params }) => sessions.read(actor, params.sessionId)),
  on(contract.createSession, ({ actor, body }) => sessions.create(actor, body)),
  on(contract.saveSession, ({ actor, params, body }) => sessions.save(actor, params.sessionId, body)),
  on(contract.removeSession, async ({ actor, params }) => {
    await sessions.remove(actor, params.sessionId);
    return {};
  }),
  on(contract.checkPublish, async ({ actor, params }) => ({
    remarks: await publishing.check(actor, params.sessionId),
  })),
  on(contract.publishSession, ({ actor, params, body }) => publishing.publish(actor, params.sessionId, body.version)),
  on(contract.unpublishSession, ({ actor, params, body }) =>
    publishing.unpublish(actor, params.sessionId, body.version),
  ),
  on(contract.getMyDay, ({ actor, query }) => myDay(actor, query.date)),
];
