/** Settings come from the environment, are read once at start, and are refused with a clear list where they don't make sense. */
import { z } from 'zod';

const flag = z
  .enum(['0', '1', 'true', 'false', ''])
  .default('')
  .transform((value) => value === '1' || value === 'true');

const Environment = z.object({
  DATABASE_URL: z.string().regex(/^postgres(ql)?:\/\//, 'must be a postgresql:// address'),
  PORT: z.coerce.number().int().min(0).max(65535).default(4000),
  HOST: z.string().default('127.0.0.1'),
  APP_ORIGIN: z.url().optional(),
  SESSION_SECRET: z.string().min(32, 'must have at least 32 characters (for example `openssl rand -hex 32`)'),
  SMTP_URL: z
    .string()
    .regex(/^smtps?:\/\//, 'must be an smtp:// or smtps:// address')
    .optional(),
  MAIL_FROM: z.string().default('Heddle <no-reply@heddle.example>'),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
  HEDDLE_PROCESS: z.enum(['all', 'web', 'worker']).default('all'),
  TRUST_PROXY: z.coerce.number().int().min(0).max(5).default(0),
  APP_ROOT: z.string().optional(),
  DEMO: flag,
});

export interface Settings {
  databaseUrl: string;
  port: number;
  host: string;
  /** Links in messages are made from this, never from a request's Host. */
  origin: string;
  secure: boolean;
  sessionSecret: string;
  smtpUrl: string | null;
  mailFrom: string;
  logLevel: string;
  process: 'all' | 'web' | 'worker';
  trustProxy: number;
  /** The folder that holds `emails`, `drizzle/migrations` and `dist`. */
  root: string;
  demo: boolean;
}

/** Reads the settings or throws one error that lists everything that is wrong. */
export function readSettings(environment: Record<string, string | undefined>): Settings {
  const given = Object.fromEntries(Object.entries(environment).filter(([, value]) => value !== ''));
  const result = Environment.safeParse(given);
  if (!result.success) {
    const lines = result.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`);
    throw new Error(`These settings need attention before the server can start:\n${lines.join('\n')}`);
  }
  const env = result.data;
  const origin = (env.APP_ORIGIN ?? `http://localhost:${env.PORT}`).replace(/\/$/, '');
  return {
    databaseUrl: env.DATABASE_URL,
    port: env.PORT,
    host: env.HOST,
    origin,
    secure: origin.startsWith('https://'),
    sessionSecret: env.SESSION_SECRET,
    smtpUrl: env.SMTP_URL ?? null,
    mailFrom: env.MAIL_FROM,
    logLevel: env.LOG_LEVEL,
    process: env.HEDDLE_PROCESS,
    trustProxy: env.TRUST_PROXY,
    root: env.APP_ROOT ?? process.cwd(),
    demo: env.DEMO,
  };
}
