export { answerOwn } from './answer-pairing';
export { keepDeadlines } from './keep-deadlines';
export { pairingsRoutes } from './pairings-router';
