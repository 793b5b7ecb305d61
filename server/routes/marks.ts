import type { Route } from './on';

export const markRoutes: Route[] = [];
