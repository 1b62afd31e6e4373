export { loadProfiles } from './load-profiles';
export { profilesRoutes } from './profiles-router';
export { ensureProfile, toPublicProfile } from './show-profile';
export { updateSection } from './update-section';
