import { live } from '../../shared/contracts/live';
import type { LiveHub } from './liveHub';
import { on, type Route } from './on';

export const liveRoutes: Route[] = [
  on(live, ({ actor, req, res }) => {
    (req.app.locals.liveHub as LiveHub).add(actor.team.id, res);
    return undefined;
  }),
];
