import type { RouteObject } from 'react-router-dom';

/** Addresses of Intake and Holdings. */
export const intakeRoutes: RouteObject[] = [];
