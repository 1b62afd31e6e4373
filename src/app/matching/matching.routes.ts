import type { Routes } from '@angular/router';

/** Inside a cycle's frame: runs, plans, publishing. */
export const matchingRoutes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: 'Runs and plan',
    loadComponent: () => import('./runs-page/runs-page').then((m) => m.RunsPage),
  },
  {
    path: 'forecast',
    title: 'Forecast',
    loadComponent: () => import('./forecast-page/forecast-page').then((m) => m.ForecastPage),
  },
  {
    path: ':runId',
    title: 'Plan',
    loadComponent: () => import('./plan-page/plan-page').then((m) => m.PlanPage),
  },
  {
    path: ':runId/review',
    title: 'Review and publish',
    loadComponent: () => import('./review-page/review-page').then((m) => m.ReviewPage),
  },
  {
    path: ':runId/compare/:otherId',
    title: 'Compare two plans',
    loadComponent: () => import('./compare-page/compare-page').then((m) => m.ComparePage),
  },
];
