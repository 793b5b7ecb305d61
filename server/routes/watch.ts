import type { Route } from './on';

export const watchRoutes: Route[] = [];
