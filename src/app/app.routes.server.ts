import { RenderMode, type ServerRoute } from '@angular/ssr';

/** How each page is rendered. Nothing is prerendered: every page carries its own CSP nonce. */
export const serverRoutes: ServerRoute[] = [
  { path: 'profiles/mine', renderMode: RenderMode.Client }, // an editor: nothing to read before it runs
  { path: 'cycles/new', renderMode: RenderMode.Client }, // an editor
  { path: 'cycles/:cycleId/edit', renderMode: RenderMode.Client }, // an editor
  { path: 'cycles/:cycleId/rules', renderMode: RenderMode.Client }, // an editor with live effects
  { path: 'cycles/:cycleId/applications', renderMode: RenderMode.Client }, // a large table that is worked in
  { path: 'cycles/:cycleId/applications/import', renderMode: RenderMode.Client }, // needs a file of the visitor's machine
  { path: '**', renderMode: RenderMode.Server }, // people read it before anything runs
];
