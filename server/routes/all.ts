import { allEndpoints } from '../../shared/contracts/all';
import { accountRoutes } from './account';
import { kitRoutes } from './kit';
import { liveRoutes } from './live';
import { markRoutes } from './marks';
import { movementRoutes } from './movements';
import type { Route } from './on';
import { peopleRoutes } from './people';
import { recordingRoutes } from './recordings';
import { searchRoutes } from './search';
import { sessionRoutes } from './sessions';
import { uploadRoutes } from './uploads';
import { watchRoutes } from './watch';

export const allRoutes: readonly Route[] = [
  ...accountRoutes,
  ...peopleRoutes,
  ...kitRoutes,
  ...movementRoutes,
  ...sessionRoutes,
  ...recordingRoutes,
  ...uploadRoutes,
  ...markRoutes,
  ...watchRoutes,
  ...searchRoutes,
  ...liveRoutes,
];

/** Declared operations that no route answers: none, or the process does not start. */
export function unanswered(): string[] {
  const answered = new Set(allRoutes.map((route) => route.endpoint));
  return allEndpoints.filter(({ endpoint }) => !answered.has(endpoint)).map(({ name }) => name);
}
