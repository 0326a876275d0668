import { type BetterAuthOptions, betterAuth } from 'better-auth';
import { drizzleAdapter } from 'better-auth/adapters/drizzle';
import { organization } from 'better-auth/plugins/organization';
import type { Logger } from 'pino';
import { limits } from '#shared/limits';
import type { Database } from '../db/client';
import { onlyOrganisationOf } from '../db/queries/memberships';
import {
  accounts,
  invitations,
  members,
  organisations,
  people,
  sessions,
  verifications,
} from '../db/schema/people';
import { hashSessionTokens } from './hash-session-tokens';
import { hashPassword, verifyPassword } from './password-hash';

interface AuthOptions {
  db: Database;
  secret: string;
  publicUrl: string;
  newId(): string;
  log: Logger;
  /** Writes the mail with the link; never tells whether the address is known. */
  sendPasswordReset(person: { id: string; name: string; email: string }, token: string): Promise<void>;
  /** After the new password stands and every session of the person has ended. */
  afterPasswordReset(personId: string): Promise<void>;
}

/** Only this header says where a request came from, and only our own middleware writes it. */
export const addressHeader = 'x-clauseway-address';
export const sessionHours = 12;
const resetLinkSeconds = 3600;

/**
 * Sessions, passwords and resets. Its own HTTP routes are not mounted: ours call it, so that one check of
 * origins and one set of rate limits hold for everything.
 */
export function createAuth(options: AuthOptions) {
  const { db, secret, publicUrl, newId, log } = options;
  const adapter = drizzleAdapter(db, {
    provider: 'mysql',
    schema: { people, sessions, accounts, verifications, organisations, members, invitations },
  });
  return betterAuth({
    appName: 'Clauseway',
    baseURL: publicUrl,
    secret,
    telemetry: { enabled: false },
    logger: { log: (level, message) => log[level === 'debug' ? 'debug' : level](`sign-in: ${message}`) },
    database: (given: BetterAuthOptions) => hashSessionTokens(adapter(given)),
    user: { modelName: 'people' },
    session: {
      modelName: 'sessions',
      fields: { userId: 'personId' },
      expiresIn: sessionHours * 3600,
      updateAge: 3600,
      cookieCache: { enabled: false },
    },
    account: { modelName: 'accounts', fields: { userId: 'personId' } },
    verification: { modelName: 'verifications', storeIdentifier: 'hashed' },
    emailAndPassword: {
      enabled: true,
      disableSignUp: true,
      minPasswordLength: limits.passwordMinimumCharacters,
      maxPasswordLength: limits.passwordMaximumCharacters,
      password: { hash: hashPassword, verify: verifyPassword },
      revokeSessionsOnPasswordReset: true,
      resetPasswordTokenExpiresIn: resetLinkSeconds,
      sendResetPassword: ({ user, token }) => options.sendPasswordReset(user, token),
      onPasswordReset: ({ user }) => options.afterPasswordReset(user.id),
    },
    rateLimit: { enabled: false },
    databaseHooks: {
      session: {
        create: {
          before: async (session) => ({
            data: { ...session, activeOrganizationId: await onlyOrganisationOf(db, session.userId) },
          }),
        },
      },
    },
    advanced: {
      cookiePrefix: 'clauseway',
      useSecureCookies: publicUrl.startsWith('https:'),
      database: { generateId: () => newId() },
      ipAddress: { ipAddressHeaders: [addressHeader] },
    },
    plugins: [
      organization({
        allowUserToCreateOrganization: false,
        schema: {
          organization: { modelName: 'organisations' },
          member: { modelName: 'members', fields: { organizationId: 'organisationId', userId: 'personId' } },
          invitation: { modelName: 'invitations', fields: { organizationId: 'organisationId' } },
          session: { fields: { activeOrganizationId: 'activeOrganisationId' } },
        },
      }),
    ],
  });
}

export type Auth = ReturnType<typeof createAuth>;
