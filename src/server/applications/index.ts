export { applicationsRoutes } from './applications-router';
export { submitApplication, type Submission } from './submit-application';
export { withdrawApplication } from './withdraw-application';
