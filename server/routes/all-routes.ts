import type { Settings } from '../env';
import type { Route } from './define-route';

/** Everything that the API answers, by resource. A new route is added here and nowhere else. */
export function allRoutes(_settings: Settings): Route[] {
  return [];
}
