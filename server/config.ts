import { z } from 'zod';

const Environment = z.object({
  NODE_ENV: z.enum(['development', 'production', 'test'], { error: 'NODE_ENV must be development, production or test' }).default('development'),
  /** Where the app's own, restricted role signs in. */
  DATABASE_URL: z.string({ error: 'DATABASE_URL must be a PostgreSQL address' }).regex(/^postgres(?:ql)?:\/\//, 'DATABASE_URL must be a PostgreSQL address'),
  HOST: z.string().default('127.0.0.1'),
  PORT: z.coerce.number().int().min(0).max(65_535, 'PORT must be a port number').default(4800),
  /** Signs the session cookie; at least 32 characters in production. */
  SESSION_SECRET: z.string().min(32, 'SESSION_SECRET must have at least 32 characters'),
  UPLOADS_DIR: z.string().default('uploads'),
  CLIENT_DIR: z.string().default('dist'),
  /** Address that people reach the app by; links in mails are built from it. */
  PUBLIC_URL: z.url({ error: 'PUBLIC_URL must be a web address' }).optional(),
  /** How many proxies stand in front. */
  TRUSTED_PROXIES: z.coerce.number().int().min(0).max(5).default(0),
  LOG_LEVEL: z.enum(['silent', 'error', 'warn', 'info', 'debug']).default('info'),
  POOL_SIZE: z.coerce.number().int().min(1).max(100).default(10),
});

export type Config = Readonly<{
  mode: 'development' | 'production' | 'test';
  databaseUrl: string;
  host: string;
  port: number;
  sessionSecret: string;
  uploadsDir: string;
  clientDir: string;
  publicUrl: string;
  trustedProxies: number;
  logLevel: string;
  poolSize: number;
}>;

/**
 * Reads the environment once. A wrong value stops the start and names its variable.
 *
 * @throws Error with one line per wrong variable
 */
export function readConfig(environment: Record<string, string | undefined>): Config {
  const read = Environment.safeParse(environment);
  if (!read.success) {
    const lines = read.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`);
    throw new Error(`Loafmark cannot start:\n${lines.join('\n')}`);
  }
  const env = read.data;
  if (env.NODE_ENV === 'production' && env.PUBLIC_URL === undefined) {
    throw new Error('Loafmark cannot start:\nPUBLIC_URL: must be set in production, so that mails name the right address');
  }
  return Object.freeze({
    mode: env.NODE_ENV,
    databaseUrl: env.DATABASE_URL,
    host: env.HOST,
    port: env.PORT,
    sessionSecret: env.SESSION_SECRET,
    uploadsDir: env.UPLOADS_DIR,
    clientDir: env.CLIENT_DIR,
    publicUrl: env.PUBLIC_URL ?? `http://${env.HOST}:${env.PORT}`,
    trustedProxies: env.TRUSTED_PROXIES,
    logLevel: env.LOG_LEVEL,
    poolSize: env.POOL_SIZE,
  });
}
