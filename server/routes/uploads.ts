import type { Route } from './on';

export const uploadRoutes: Route[] = [];
