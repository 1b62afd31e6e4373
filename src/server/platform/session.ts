/** Sessions in PostgreSQL, sign-in through passport, and the defence against forged requests. */
import connectPgSimple from 'connect-pg-simple';
import cookieParser from 'cookie-parser';
import { doubleCsrf } from 'csrf-csrf';
import type { NextFunction, Request, RequestHandler, Response } from 'express';
import session from 'express-session';
import passport from 'passport';
import { Strategy } from 'passport-local';
import type pg from 'pg';
import type { Actor } from './context';
import { Problem } from './problems';
import type { Settings } from './settings';

declare module 'express-session' {
  interface SessionData {
    startedAt: number;
    seenAt: number;
  }
}

declare global {
  // passport's own extension point for the type of req.user.
  // eslint-disable-next-line @typescript-eslint/no-namespace
  namespace Express {
    // eslint-disable-next-line @typescript-eslint/no-empty-object-type
    interface User extends Actor {}
  }
}

const MINUTE = 60_000;
/** Idle and absolute limits; staff see other people's data, so theirs are shorter. */
const LIMITS = {
  member: { idle: 60 * MINUTE, absolute: 24 * 60 * MINUTE },
  staff: { idle: 30 * MINUTE, absolute: 12 * 60 * MINUTE },
};
// Writing on every read would cost a disk flush each; once in five minutes is enough to keep a session alive.
const TOUCH_EVERY = 5 * MINUTE;

/** How the capability `accounts` answers for people; given by the composition root. */
export interface SignInDoor {
  checkPassword(email: string, password: string): Promise<Actor | null>;
  findActor(personId: string): Promise<Actor | null>;
}

export interface SessionHandling {
  middleware: RequestHandler[];
  csrfCookie: RequestHandler;
  csrfCheck: RequestHandler;
  renewCsrf(req: Request, res: Response): void;
  /** Checks e-mail and password; null where they don't fit. Does not sign in. */
  authenticate(req: Request, res: Response): Promise<Actor | null>;
}

export const XSRF_COOKIE = 'XSRF-TOKEN';

export function createSessions(pool: pg.Pool, settings: Settings, door: SignInDoor): SessionHandling {
  const cookieName = settings.secure ? '__Host-heddle' : 'heddle';
  const Store = connectPgSimple(session);
  const store = new Store({ pool, tableName: 'sessions', createTableIfMissing: false, disableTouch: true });
  const authenticator = createAuthenticator(door);
  const csrf = createCsrf(settings);
  return {
    middleware: [
      cookieParser(),
      session({
        store,
        name: cookieName,
        secret: settings.sessionSecret,
        resave: false,
        saveUninitialized: false,
        cookie: { httpOnly: true, sameSite: 'lax', secure: settings.secure, path: '/', maxAge: LIMITS.member.idle },
      }),
      authenticator.session(),
      endOldSessions,
    ],
    csrfCookie: (req, res, next) => {
      csrf.generateCsrfToken(req, res, { overwrite: false, validateOnReuse: false });
      next();
    },
    csrfCheck: (req, res, next) =>
      csrf.doubleCsrfProtection(req, res, (error: unknown) => next(error ? forged() : undefined)),
    renewCsrf: (req, res) => void csrf.generateCsrfToken(req, res, { overwrite: true }),
    authenticate: (req, res) => authenticate(authenticator, req, res),
  };
}

const forged = (): Problem =>
  new Problem('forbidden', 'This request did not come from a page of this site. Reload the page and try again', {
    detail: 'csrf',
  });

function createAuthenticator(door: SignInDoor): passport.Authenticator {
  const authenticator = new passport.Passport();
  authenticator.use(
    new Strategy({ usernameField: 'email', passwordField: 'password' }, (email, password, done) => {
      door.checkPassword(email, password).then((actor) => done(null, actor ?? false), done);
    }),
  );
  authenticator.serializeUser((user, done) => done(null, user.personId));
  authenticator.deserializeUser((personId: string, done) => {
    door.findActor(personId).then((actor) => done(null, actor ?? false), done);
  });
  return authenticator;
}

function endOldSessions(req: Request, _res: Response, next: NextFunction): void {
  const actor = req.user;
  if (!actor) return next();
  const now = Date.now();
  const limits = actor.roles.length > 0 ? LIMITS.staff : LIMITS.member;
  const { startedAt = 0, seenAt = 0 } = req.session;
  if (now - startedAt > limits.absolute || now - seenAt > limits.idle + TOUCH_EVERY) {
    req.session.destroy(() => {
      req.user = undefined;
      next();
    });
    return;
  }
  if (now - seenAt > TOUCH_EVERY) req.session.seenAt = now;
  next();
}

function createCsrf(settings: Settings) {
  return doubleCsrf({
    getSecret: () => settings.sessionSecret,
    // A visitor has no session; the token is then bound to nothing but the secret, beside SameSite and the origin check.
    getSessionIdentifier: (req) => (req.user ? req.sessionID : 'visitor'),
    cookieName: XSRF_COOKIE,
    cookieOptions: { httpOnly: false, sameSite: 'lax', secure: settings.secure, path: '/' },
    getCsrfTokenFromRequest: (req) => req.get('x-xsrf-token'),
  });
}

function authenticate(authenticator: passport.Authenticator, req: Request, res: Response): Promise<Actor | null> {
  return new Promise((resolve, reject) => {
    const done = (error: unknown, user?: Express.User | false | null) =>
      error ? reject(error as Error) : resolve(user || null);
    (authenticator.authenticate('local', done) as RequestHandler)(req, res, reject);
  });
}

/** Starts a new session for a person; the old session's id stops working. */
export async function startSession(req: Request, actor: Actor): Promise<void> {
  await new Promise<void>((resolve, reject) =>
    req.logIn(actor, (error: unknown) => (error ? reject(error as Error) : resolve())),
  );
  req.session.startedAt = Date.now();
  req.session.seenAt = Date.now();
}

export async function endSession(req: Request): Promise<void> {
  await new Promise<void>((resolve, reject) =>
    req.session.destroy((error: unknown) => (error ? reject(error as Error) : resolve())),
  );
  req.user = undefined;
}
