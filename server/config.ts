import { availableParallelism } from 'node:os';
import { z } from 'zod';

const port = z.coerce.number().int().min(0).max(65_535);
const databaseUrl = z.string().regex(/^postgres(ql)?:\/\//, 'must begin with postgres://');
/** Environment variables that are set but empty count as not set. */
const optional = z
  .string()
  .optional()
  .transform((text) => (text === '' ? undefined : text));

/** The environment of the api and the worker: names, meaning and defaults. */
const environmentSchema = z
  .object({
    /** Connection of the role that owns no table. */
    DATABASE_URL: databaseUrl,
    HOST: z.string().min(1).default('127.0.0.1'),
    PORT: port.default(8480),
    /** Address that people use, for links in mails; default: made from HOST and PORT. */
    PUBLIC_URL: optional.pipe(z.url().optional()),
    /** Signs access tokens. Every api process needs the same one. */
    TOKEN_SECRET: z.string().min(32, 'must have at least 32 characters'),
    /** `1`: demo sign-ins and the fake inbox are shown. */
    DEMO: z.enum(['0', '1', '']).default('0'),
    SMTP_URL: optional.pipe(
      z
        .string()
        .regex(/^smtps?:\/\//, 'must begin with smtp:// or smtps://')
        .optional(),
    ),
    MAIL_FROM: z.string().min(3).default('Ringwright <no-reply@ringwright.example>'),
    /** Folder of the exported web application. */
    WEB_DIR: z.string().min(1).default('dist/web'),
    TLS_CERT_FILE: optional,
    TLS_KEY_FILE: optional,
    LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent']).default('info'),
    /** Cost of bcrypt: each step doubles the work. Tests use less. */
    PASSWORD_COST: z.coerce.number().int().min(4).max(15).default(12),
    /** Widens the limits on sign-in, registration and password mails, for many people behind one address and for tests. */
    RATE_LIMIT_FACTOR: z.coerce.number().min(1).max(10_000).default(1),
    WORKER_PORT: port.default(8481),
    /** Child processes that decode and measure; default: one per core. */
    WORKER_CHILDREN: z.coerce.number().int().min(1).max(64).optional(),
    /** Wall-clock limit of one job, s. */
    FRAME_SECONDS: z.coerce.number().int().min(1).max(3600).default(120),
    /** Memory limit of one child process, MiB. */
    CHILD_MEMORY_MB: z.coerce.number().int().min(128).default(1500),
  })
  .refine((e) => (e.TLS_CERT_FILE === undefined) === (e.TLS_KEY_FILE === undefined), {
    path: ['TLS_CERT_FILE'],
    error: 'must be given together with TLS_KEY_FILE',
  });

export interface Config {
  databaseUrl: string;
  host: string;
  port: number;
  publicUrl: string;
  tokenSecret: string;
  demo: boolean;
  /** Null: nothing is sent; mails wait in the outbox. */
  smtpUrl: string | null;
  mailFrom: string;
  webDir: string;
  tls: { certFile: string; keyFile: string } | null;
  logLevel: string;
  passwordCost: number;
  rateLimitFactor: number;
  workerPort: number;
  workerChildren: number;
  frameSeconds: number;
  childMemoryMb: number;
}

type Environment = Record<string, string | undefined>;

/** Says which environment variables are missing or wrong. */
export class ConfigError extends Error {}

/** Reads the environment once, at the start of a process; throws {@link ConfigError} that names what is wrong. */
export function readConfig(environment: Environment = process.env): Config {
  const e = parse(environmentSchema, environment);
  const tls = e.TLS_CERT_FILE !== undefined && e.TLS_KEY_FILE !== undefined;
  const host = e.HOST.includes(':') ? `[${e.HOST}]` : e.HOST;
  return {
    databaseUrl: e.DATABASE_URL,
    host: e.HOST,
    port: e.PORT,
    publicUrl: (e.PUBLIC_URL ?? `${tls ? 'https' : 'http'}://${host}:${e.PORT}`).replace(/\/+$/, ''),
    tokenSecret: e.TOKEN_SECRET,
    demo: e.DEMO === '1',
    smtpUrl: e.SMTP_URL ?? null,
    mailFrom: e.MAIL_FROM,
    webDir: e.WEB_DIR,
    tls: tls ? { certFile: e.TLS_CERT_FILE as string, keyFile: e.TLS_KEY_FILE as string } : null,
    logLevel: e.LOG_LEVEL,
    passwordCost: e.PASSWORD_COST,
    rateLimitFactor: e.RATE_LIMIT_FACTOR,
    workerPort: e.WORKER_PORT,
    workerChildren: e.WORKER_CHILDREN ?? availableParallelism(),
    frameSeconds: e.FRAME_SECONDS,
    childMemoryMb: e.CHILD_MEMORY_MB,
  };
}

/** Connection of the owner of the tables: migrations only. */
export function readOwnerDatabaseUrl(environment: Environment = process.env): string {
  return parse(z.object({ OWNER_DATABASE_URL: databaseUrl }), environment).OWNER_DATABASE_URL;
}

function parse<Schema extends z.ZodType>(schema: Schema, environment: Environment): z.output<Schema> {
  const parsed = schema.safeParse(environment);
  if (parsed.success) return parsed.data;
  const lines = parsed.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`);
  throw new ConfigError(`The environment is not complete:\n${lines.join('\n')}`);
}
