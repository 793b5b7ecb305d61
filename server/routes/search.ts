import type { Route } from './on';

export const searchRoutes: Route[] = [];
