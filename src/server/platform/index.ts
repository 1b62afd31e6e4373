/** What capabilities use of the platform. */
export { actorOf, hasRole, inTransaction, type Actor, type Context, type Enqueue } from './context';
export { databaseCode, MATCHING_ROLE, transaction, violatedConstraint, type Db } from './database';
export { grouped } from './grouped';
export { notFound, Problem, read, stale } from './problems';
export { Download, FramedPage, route, type RequestContext, type Route } from './routes';
export { hashToken, tokenFor } from './tokens';
export type { Settings } from './settings';
