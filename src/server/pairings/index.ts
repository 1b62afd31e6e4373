export { answerOwn } from './answer-pairing';
export { endPairing } from './end-pairing';
export { keepDeadlines } from './keep-deadlines';
export { listPairingsOfCycle, type PairingRow } from './pairings-queries';
export { pairingsRoutes } from './pairings-router';
