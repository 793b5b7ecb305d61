import type { Route } from './on';

export const sessionRoutes: Route[] = [];
