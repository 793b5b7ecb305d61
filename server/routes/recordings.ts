import type { Route } from './on';

export const recordingRoutes: Route[] = [];
