import type { Routes } from '@angular/router';

/** Coordinators: all cycles, a new one, and the frame in which one cycle is worked on. */
export const cyclesRoutes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: 'Cycles',
    loadComponent: () => import('./cycles-page/cycles-page').then((m) => m.CyclesPage),
  },
  {
    path: 'new',
    title: 'New cycle',
    loadComponent: () => import('./cycle-form/new-cycle-page').then((m) => m.NewCyclePage),
  },
];

/** Inside a cycle's frame: its overview, its dates and texts, its rules and criteria. */
export const cycleRoutes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: 'Cycle',
    loadComponent: () => import('./cycle-overview/cycle-overview').then((m) => m.CycleOverview),
  },
  {
    path: 'edit',
    title: 'Dates and texts',
    loadComponent: () => import('./cycle-form/edit-cycle-page').then((m) => m.EditCyclePage),
  },
  {
    path: 'rules',
    title: 'Rules and criteria',
    loadComponent: () => import('./rules-page/rules-page').then((m) => m.RulesPage),
  },
];
