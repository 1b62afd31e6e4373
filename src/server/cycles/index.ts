export { saveSettings } from './cycle-settings';
export { cyclesRoutes } from './cycles-router';
export { findCycle, holdCycle, listCycles, type CycleRow } from './cycles-queries';
export { createCycle } from './edit-cycle';
export { moveCycle, movePhase } from './move-cycle';
