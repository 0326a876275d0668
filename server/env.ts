import { z } from 'zod';

const yesNo = z.enum(['yes', 'no']);

/** Every setting, with the words that the README's table uses. */
const settingsSchema = z.object({
  DATABASE_URL: z
    .url({ protocol: /^mysql$/, error: 'is a mysql:// address' })
    .describe('MariaDB for the application. Set: nothing local is started and nothing is seeded.'),
  DATABASE_MIGRATION_URL: z
    .url({ protocol: /^mysql$/, error: 'is a mysql:// address' })
    .optional()
    .describe(
      'The same database as its owner: migrates at the start and renews the rights of the application.',
    ),
  SESSION_SECRET: z
    .string()
    .min(32, 'has at least 32 characters')
    .describe(
      'Signs session cookies; at least 32 characters, the same on every server. Required with an external database.',
    ),
  PUBLIC_URL: z
    .url({ protocol: /^https?$/, error: 'is an http:// or https:// address' })
    .optional()
    .describe(
      'The address people open; links in mails and the check of origins use it. Required with an external database.',
    ),
  MAIL_FROM: z
    .string()
    .min(3, 'is a mail address')
    .default('Clauseway <clauseway@localhost.example>')
    .describe('Sender of every mail. Required with an external database, where it has no default.'),
  SMTP_URL: z
    .url({ protocol: /^smtps?$/, error: 'is an smtp:// or smtps:// address' })
    .optional()
    .describe(
      'Mail server. Default: with an external database smtp://127.0.0.1:25, else mail is caught and shown at /caught-mail.',
    ),
  HOST: z.string().min(1).default('127.0.0.1').describe('Address to listen on; loopback only by default.'),
  PORT: z.coerce
    .number('is a port number')
    .int('is a whole number')
    .min(0, 'is 0 to 65535')
    .max(65535, 'is 0 to 65535')
    .default(4170)
    .describe('Port to listen on; unset, `npm start` takes the first free one from 4170 to 4179.'),
  TRUSTED_PROXIES: z
    .string()
    .default('')
    .describe('Comma-separated addresses of reverse proxies whose X-Forwarded-For counts. Default: none.'),
  DEMO: yesNo
    .default('yes')
    .describe('`no` starts the private instance empty, with a set-up link in place of the demo.'),
  LOG_LEVEL: z
    .enum(['debug', 'info', 'warn', 'error', 'silent'], 'is debug, info, warn, error or silent')
    .default('info')
    .describe('Least level that is logged.'),
  CLAUSEWAY_DATA: z
    .string()
    .default('.data')
    .describe('Directory of the private instance: database, secrets, demo workbooks, log.'),
  CLAUSEWAY_INSTANCE: z
    .enum(['private', 'development', 'external'])
    .default('external')
    .describe('Set by the launcher; says which kind of instance this is.'),
});

export interface Settings {
  instance: 'private' | 'development' | 'external';
  databaseUrl: string;
  migrationUrl: string | null;
  sessionSecret: string;
  publicUrl: string;
  mailFrom: string;
  /** Null: mail is caught on loopback and shown. */
  smtpUrl: string | null;
  host: string;
  port: number;
  trustedProxies: string[];
  seedDemo: boolean;
  logLevel: 'debug' | 'info' | 'warn' | 'error' | 'silent';
  dataDirectory: string;
}

export class SettingsError extends Error {}

/** Parses the environment once; every fault is named in one message. */
export function parseSettings(environment: Record<string, string | undefined>): Settings {
  const present = Object.fromEntries(Object.entries(environment).filter(([, value]) => value !== ''));
  const parsed = settingsSchema.safeParse(present);
  const faults = parsed.success ? [] : parsed.error.issues.map((issue) => faultOf(issue, present));
  faults.push(...missingForExternal(present, faults));
  if (!parsed.success || faults.length > 0) {
    throw new SettingsError(
      ['These settings cannot be used:', ...faults.map((line) => `  ${line}`)].join('\n'),
    );
  }
  const { data } = parsed;
  const external = data.CLAUSEWAY_INSTANCE === 'external';
  return {
    instance: data.CLAUSEWAY_INSTANCE,
    databaseUrl: data.DATABASE_URL,
    migrationUrl: data.DATABASE_MIGRATION_URL ?? null,
    sessionSecret: data.SESSION_SECRET,
    publicUrl: (data.PUBLIC_URL ?? `http://${data.HOST}:${data.PORT}`).replace(/\/+$/, ''),
    mailFrom: data.MAIL_FROM,
    smtpUrl: data.SMTP_URL ?? (external ? 'smtp://127.0.0.1:25' : null),
    host: data.HOST,
    port: data.PORT,
    trustedProxies: data.TRUSTED_PROXIES.split(',')
      .map((address) => address.trim())
      .filter((address) => address !== ''),
    seedDemo: !external && data.DEMO === 'yes',
    logLevel: data.LOG_LEVEL,
    dataDirectory: data.CLAUSEWAY_DATA,
  };
}

/** `NAME`, default and meaning of every setting, for documents. */
export function describeSettings(): { name: string; meaning: string; fallback: string }[] {
  return Object.entries(settingsSchema.shape).map(([name, schema]) => {
    const fallback = z.toJSONSchema(schema, { io: 'input' }).default;
    return {
      name,
      meaning: schema.description ?? '',
      fallback: fallback === undefined ? '' : String(fallback),
    };
  });
}

function faultOf(issue: z.core.$ZodIssue, present: Record<string, string | undefined>): string {
  const name = String(issue.path[0]);
  return present[name] === undefined ? `${name} is missing` : `${name} ${issue.message}`;
}

/** On a public address nothing may be guessed: neither who sends the mail nor where its links lead. */
function missingForExternal(present: Record<string, string | undefined>, faults: string[]): string[] {
  if ((present.CLAUSEWAY_INSTANCE ?? 'external') !== 'external') return [];
  return ['SESSION_SECRET', 'PUBLIC_URL', 'MAIL_FROM']
    .filter((name) => present[name] === undefined)
    .map((name) => `${name} is missing`)
    .filter((line) => !faults.includes(line));
}
