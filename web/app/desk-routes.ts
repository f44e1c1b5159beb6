import type { RouteObject } from 'react-router-dom';

/** The planner's desk, below RequireRole; every page is loaded when it is opened. */
export const deskRoutes: RouteObject[] = [];
