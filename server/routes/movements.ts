import type { Route } from './on';

export const movementRoutes: Route[] = [];
