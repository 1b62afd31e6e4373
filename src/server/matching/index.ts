export { dueInWords, endOfDay } from './deadlines';
export { matchingRoutes } from './matching-router';
export { questionThread } from './matching-thread';
export {
  messagePerson,
  proposalMessage,
  PROPOSAL_PURPOSE,
  sharedSentences,
  type MessagePerson,
} from './proposal-messages';
export { publishRun } from './publish-run';
export { startRun } from './start-run';
export { reviveRuns, workRun } from './work-run';
