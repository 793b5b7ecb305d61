import type { Route } from './on';

export const kitRoutes: Route[] = [];
