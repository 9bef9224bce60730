import { Inject } from '@nestjs/common';
import { randomBytes } from 'node:crypto';
import { readFileSync, statSync } from 'node:fs';
import { isIP } from 'node:net';
import { z } from 'zod';

const onOff = z.enum(['on', 'off']);
const count = (most: number) => z.coerce.number().int().min(1).max(most);

const secretsFileSchema = z.object({ jwtSecret: z.string().min(32) });

/** The environment variables that the API reads, and nothing else does. */
const environmentSchema = z.object({
  NODE_ENV: z.string().default('development'),
  DATABASE_URL: z.url({
    protocol: /^postgres(ql)?$/,
    error: 'must be a postgresql:// address, as the app role',
  }),
  HOST: z.string().min(1).default('127.0.0.1'),
  PORT: z.coerce.number().int().min(0).max(65_535).default(4300),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent']).default('info'),
  NOONWELL_JWT_SECRET: z.string().min(32, { error: 'must have at least 32 characters' }).optional(),
  NOONWELL_SECRETS_FILE: z.string().optional(),
  NOONWELL_DEMO: onOff.optional(),
  NOONWELL_WEB_DIST: z.string().optional(),
  NOONWELL_SECURE_COOKIES: onOff.optional(),
  /** Reverse proxies in front whose X-Forwarded-For is believed. */
  NOONWELL_TRUSTED_PROXIES: z.coerce.number().int().min(0).max(10).default(0),
  NOONWELL_SIGN_INS_PER_ADDRESS: count(100_000).default(60),
  NOONWELL_SIGN_INS_PER_ACCOUNT: count(100_000).default(10),
  NOONWELL_COSTLY_CALLS_PER_PERSON: count(100_000).default(60),
});

export interface Settings {
  readonly databaseUrl: string;
  readonly host: string;
  readonly port: number;
  readonly logLevel: z.infer<typeof environmentSchema>['LOG_LEVEL'];
  readonly jwtSecret: string;
  readonly demo: boolean;
  readonly webDist: string | undefined;
  readonly secureCookies: boolean;
  readonly trustedProxies: number;
  /** Calls in the windows of http/limits.ts. */
  readonly limits: {
    readonly signInsPerAddress: number;
    readonly signInsPerAccount: number;
    readonly costlyPerPerson: number;
  };
}

/** Injection token of the settings. */
export const SETTINGS = Symbol('settings');
export const InjectSettings = (): ReturnType<typeof Inject> => Inject(SETTINGS);

/** The environment is incomplete or contradicts itself; the message names each variable. */
export class SettingsError extends Error {
  override readonly name = 'SettingsError';
}

/** @throws SettingsError naming each variable that is wrong; values are never repeated, they may be secrets */
export function readSettings(environment: Readonly<Record<string, string | undefined>>): Settings {
  const parsed = environmentSchema.safeParse(environment);
  if (!parsed.success) {
    const lines = parsed.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`);
    throw new SettingsError(`The settings are wrong:\n${lines.join('\n')}`);
  }
  const env = parsed.data;
  const production = env.NODE_ENV === 'production';
  const local = isLoopback(env.HOST);
  return {
    databaseUrl: env.DATABASE_URL,
    host: env.HOST,
    port: env.PORT,
    logLevel: env.LOG_LEVEL,
    jwtSecret: jwtSecret(env.NOONWELL_JWT_SECRET, env.NOONWELL_SECRETS_FILE, production),
    // Sign-in without a password must not reach a network, directly or through a proxy on this machine, because
    // somebody forgot to switch it off.
    demo: env.NOONWELL_DEMO === undefined ? local && !production : env.NOONWELL_DEMO === 'on',
    webDist: env.NOONWELL_WEB_DIST,
    // Browsers take Secure cookies over TLS only; on loopback there is none, unless a proxy in front brings it.
    secureCookies:
      env.NOONWELL_SECURE_COOKIES === undefined
        ? production && (!local || env.NOONWELL_TRUSTED_PROXIES > 0)
        : env.NOONWELL_SECURE_COOKIES === 'on',
    trustedProxies: env.NOONWELL_TRUSTED_PROXIES,
    limits: {
      signInsPerAddress: env.NOONWELL_SIGN_INS_PER_ADDRESS,
      signInsPerAccount: env.NOONWELL_SIGN_INS_PER_ACCOUNT,
      costlyPerPerson: env.NOONWELL_COSTLY_CALLS_PER_PERSON,
    },
  };
}

function jwtSecret(given: string | undefined, file: string | undefined, production: boolean): string {
  if (given !== undefined) return given;
  if (file !== undefined) return readSecretsFile(file);
  if (production) {
    throw new SettingsError(
      'The settings are wrong:\nNOONWELL_JWT_SECRET or NOONWELL_SECRETS_FILE: one of the two is needed in production',
    );
  }
  // Sessions of a development server end with it.
  return randomBytes(32).toString('hex');
}

function readSecretsFile(file: string): string {
  try {
    if ((statSync(file).mode & 0o077) !== 0) {
      throw new SettingsError(`NOONWELL_SECRETS_FILE: others can read ${file}; set its mode to 0600.`);
    }
    return secretsFileSchema.parse(JSON.parse(readFileSync(file, 'utf8'))).jwtSecret;
  } catch (error) {
    if (error instanceof SettingsError) throw error;
    // The cause could quote the file, which holds secrets.
    throw new SettingsError(
      `NOONWELL_SECRETS_FILE: ${file} is not readable JSON with a jwtSecret of at least 32 characters.`,
    );
  }
}

export function isLoopback(host: string): boolean {
  return host === 'localhost' || host === '::1' || (isIP(host) === 4 && host.startsWith('127.'));
}
