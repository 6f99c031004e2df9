import type { RouteObject } from 'react-router-dom';

/** Addresses of Slices, Estimates, Exports and the trace of a number. */
export const scienceRoutes: RouteObject[] = [];
