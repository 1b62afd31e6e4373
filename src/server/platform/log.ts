/** Structured logs: one JSON line an event, without secrets. */
import pino, { type Logger } from 'pino';

const SECRET_PATHS = [
  'req.headers.cookie',
  'req.headers.authorization',
  'req.headers["x-xsrf-token"]',
  'req.headers["x-heddle-ssr"]',
  'res.headers["set-cookie"]',
];

export const createLog = (level: string): Logger =>
  pino({ level, redact: { paths: SECRET_PATHS, censor: '[hidden]' }, timestamp: pino.stdTimeFunctions.isoTime });

/** A request's address for the log: links carry tokens in their last part or query, which must not be kept. */
export function loggedUrl(url: string): string {
  return url.replace(/[A-Za-z0-9_-]{43}(?![A-Za-z0-9_-])/g, '[token]');
}
