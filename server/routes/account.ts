import type { Route } from './on';

export const accountRoutes: Route[] = [];
