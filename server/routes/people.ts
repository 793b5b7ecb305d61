import type { Route } from './on';

export const peopleRoutes: Route[] = [];
