import { z } from 'zod';

/** Everything the process is told from outside; parsed once, before anything starts. */
export interface Config {
  readonly port: number;
  /** Of the application's role. */
  readonly databaseUrl: string;
  /** Signs access tokens, derives refresh successors and device marks; never leaves the process. */
  readonly secret: Buffer;
  readonly logLevel: 'fatal' | 'error' | 'warn' | 'info' | 'debug' | 'silent';
  /** Built client; an absolute path. */
  readonly clientFolder: string;
  /** Stamp of this build, shown by health and in the pack. */
  readonly build: string;
  /** Express' `trust proxy`: which hops' X-Forwarded-For is believed. None by default. */
  readonly trustedProxies: string | undefined;
}

/** Fewer random bytes could be guessed (security.md). */
const LEAST_SECRET_BYTES = 32;
export const DEFAULT_PORT = 4300;

const environmentSchema = z.object({
  PORT: z.coerce.number().int().min(0).max(65_535).default(DEFAULT_PORT),
  DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/ }),
  SESSION_SECRET: z
    .base64url()
    .transform((text) => Buffer.from(text, 'base64url'))
    .refine((bytes) => bytes.length >= LEAST_SECRET_BYTES, {
      message: `must hold at least ${LEAST_SECRET_BYTES} random bytes, as base64url`,
    }),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
  CLIENT_FOLDER: z.string().min(1),
  BUILD: z.string().min(1).default('development'),
  TRUSTED_PROXIES: z.string().min(1).optional(),
});

/** @throws Error with one sentence that names every variable that is missing or wrong */
export function readConfig(environment: Readonly<Record<string, string | undefined>>): Config {
  const read = environmentSchema.safeParse(environment);
  if (!read.success) {
    const wrong = read.error.issues.map(({ path, message }) => `${path.join('.')} (${message})`);
    throw new Error(`The configuration in the environment is not complete: ${wrong.join('; ')}.`);
  }
  const { data } = read;
  return {
    port: data.PORT,
    databaseUrl: data.DATABASE_URL,
    secret: data.SESSION_SECRET,
    logLevel: data.LOG_LEVEL,
    clientFolder: data.CLIENT_FOLDER,
    build: data.BUILD,
    trustedProxies: data.TRUSTED_PROXIES,
  };
}
