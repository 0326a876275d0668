import { boolean, index, int, mysqlTable, text, uniqueIndex, varchar } from 'drizzle-orm/mysql-core';
import { z } from 'zod';
import { letterheadSchema } from '#shared/contracts/organisation';
import { organisationKindSchema, waiverPolicySchema } from '#shared/contracts/roles';
import { limits } from '#shared/limits';
import { choice, id, instant, json, reference, sha256, version } from '../columns';

export const people = mysqlTable(
  'people',
  {
    id: id('id').primaryKey(),
    name: varchar('name', { length: limits.nameCharacters }).notNull(),
    /** Lower case: sign-in and invitations compare it as it stands. */
    email: varchar('email', { length: limits.emailCharacters }).notNull(),
    emailVerified: boolean('email_verified').notNull().default(false),
    image: text('image'),
    createdAt: instant('created_at').notNull(),
    updatedAt: instant('updated_at').notNull(),
  },
  (table) => [uniqueIndex('people_email').on(table.email)],
);

/** A sign-in. `token` is a hash: what the cookie carries cannot be made from a copy of this table. */
export const sessions = mysqlTable(
  'sessions',
  {
    id: id('id').primaryKey(),
    personId: id('person_id').notNull(),
    token: varchar('token', { length: 100 }).notNull(),
    expiresAt: instant('expires_at').notNull(),
    ipAddress: varchar('ip_address', { length: 64 }),
    userAgent: text('user_agent'),
    /** The organisation that the person acts for; null until one is chosen. */
    activeOrganisationId: id('active_organisation_id'),
    createdAt: instant('created_at').notNull(),
    updatedAt: instant('updated_at').notNull(),
  },
  (table) => [
    uniqueIndex('sessions_token').on(table.token),
    index('sessions_person').on(table.personId),
    reference('sessions_person_fk', table.personId, people.id).onDelete('cascade'),
  ],
);

/** A way to sign in; today always a password, hashed with argon2id. */
export const accounts = mysqlTable(
  'accounts',
  {
    id: id('id').primaryKey(),
    personId: id('person_id').notNull(),
    accountId: varchar('account_id', { length: 255 }).notNull(),
    providerId: varchar('provider_id', { length: 60 }).notNull(),
    password: text('password'),
    accessToken: text('access_token'),
    refreshToken: text('refresh_token'),
    idToken: text('id_token'),
    accessTokenExpiresAt: instant('access_token_expires_at'),
    refreshTokenExpiresAt: instant('refresh_token_expires_at'),
    scope: text('scope'),
    createdAt: instant('created_at').notNull(),
    updatedAt: instant('updated_at').notNull(),
  },
  (table) => [
    index('accounts_person').on(table.personId),
    reference('accounts_person_fk', table.personId, people.id).onDelete('cascade'),
  ],
);

/** Single-use tokens of the password reset. */
export const verifications = mysqlTable(
  'verifications',
  {
    id: id('id').primaryKey(),
    identifier: varchar('identifier', { length: 255 }).notNull(),
    value: text('value').notNull(),
    expiresAt: instant('expires_at').notNull(),
    createdAt: instant('created_at').notNull(),
    updatedAt: instant('updated_at').notNull(),
  },
  (table) => [index('verifications_identifier').on(table.identifier)],
);

export const organisations = mysqlTable(
  'organisations',
  {
    id: id('id').primaryKey(),
    name: varchar('name', { length: limits.nameCharacters }).notNull(),
    slug: varchar('slug', { length: 160 }).notNull(),
    kind: choice('kind', organisationKindSchema.options).notNull(),
    /** IANA name; dates of an agency are dates in its zone. */
    timeZone: varchar('time_zone', { length: 64 }).notNull(),
    /** Working days from submission to the due date. */
    reviewWorkingDays: int('review_working_days').notNull(),
    /** What reviewers may waive by themselves. */
    waiverPolicy: choice('waiver_policy', waiverPolicySchema.options).notNull(),
    letterhead: json('letterhead', letterheadSchema).notNull(),
    logo: text('logo'),
    metadata: text('metadata'),
    createdAt: instant('created_at').notNull(),
    version: version(),
  },
  (table) => [uniqueIndex('organisations_slug').on(table.slug)],
);

export const members = mysqlTable(
  'members',
  {
    id: id('id').primaryKey(),
    organisationId: id('organisation_id').notNull(),
    personId: id('person_id').notNull(),
    /** Roles joined by commas: `reviewer,signing engineer`. */
    role: varchar('role', { length: 200 }).notNull(),
    createdAt: instant('created_at').notNull(),
    version: version(),
  },
  (table) => [
    uniqueIndex('members_organisation_person').on(table.organisationId, table.personId),
    index('members_person').on(table.personId),
    reference('members_organisation_fk', table.organisationId, organisations.id),
    reference('members_person_fk', table.personId, people.id),
  ],
);

export const invitations = mysqlTable(
  'invitations',
  {
    id: id('id').primaryKey(),
    /** The organisation that the person is invited into. */
    organisationId: id('organisation_id').notNull(),
    /** The organisation whose administrator invites; an agency invites a contractor's first one. */
    invitedFromId: id('invited_from_id').notNull(),
    inviterId: id('inviter_id').notNull(),
    name: varchar('name', { length: limits.nameCharacters }).notNull(),
    email: varchar('email', { length: limits.emailCharacters }).notNull(),
    role: varchar('role', { length: 200 }).notNull(),
    status: choice('status', ['pending', 'accepted', 'canceled']).notNull(),
    /** Of the link's token; the token itself is only in the mail. */
    tokenHash: sha256('token_hash').notNull(),
    expiresAt: instant('expires_at').notNull(),
    createdAt: instant('created_at').notNull(),
    version: version(),
  },
  (table) => [
    uniqueIndex('invitations_token').on(table.tokenHash),
    index('invitations_organisation').on(table.organisationId, table.status),
    index('invitations_invited_from').on(table.invitedFromId, table.status),
    reference('invitations_organisation_fk', table.organisationId, organisations.id),
    reference('invitations_invited_from_fk', table.invitedFromId, organisations.id),
    reference('invitations_inviter_fk', table.inviterId, people.id),
  ],
);

/** Contractors that an agency works with. */
export const agencyContractors = mysqlTable(
  'agency_contractors',
  {
    id: id('id').primaryKey(),
    agencyId: id('agency_id').notNull(),
    contractorId: id('contractor_id').notNull(),
    createdAt: instant('created_at').notNull(),
  },
  (table) => [
    uniqueIndex('agency_contractors_pair').on(table.agencyId, table.contractorId),
    index('agency_contractors_contractor').on(table.contractorId),
    reference('agency_contractors_agency_fk', table.agencyId, organisations.id),
    reference('agency_contractors_contractor_fk', table.contractorId, organisations.id),
  ],
);

/** The link of the first day; used once, it makes the agency and its administrator. */
export const setUpLinks = mysqlTable(
  'set_up_links',
  {
    id: id('id').primaryKey(),
    tokenHash: sha256('token_hash').notNull(),
    createdAt: instant('created_at').notNull(),
    usedAt: instant('used_at'),
  },
  (table) => [uniqueIndex('set_up_links_token').on(table.tokenHash)],
);

/** Sign-ins that the sign-in page shows; filled by the demo seed only, emptied by a change of password. */
export const demoSignIns = mysqlTable(
  'demo_sign_ins',
  {
    personId: id('person_id').primaryKey(),
    position: int('position').notNull(),
    password: varchar('password', { length: 120 }).notNull(),
  },
  (table) => [reference('demo_sign_ins_person_fk', table.personId, people.id).onDelete('cascade')],
);

export const laboratories = mysqlTable(
  'laboratories',
  {
    id: id('id').primaryKey(),
    organisationId: id('organisation_id').notNull(),
    name: varchar('name', { length: limits.nameCharacters }).notNull(),
    accreditation: varchar('accreditation', { length: 120 }),
    createdAt: instant('created_at').notNull(),
    version: version(),
  },
  (table) => [
    uniqueIndex('laboratories_name').on(table.organisationId, table.name),
    reference('laboratories_organisation_fk', table.organisationId, organisations.id),
  ],
);

/** Append-only: the application may insert and read, nothing else; triggers refuse even its owner. */
export const audit = mysqlTable(
  'audit',
  {
    id: id('id').primaryKey(),
    at: instant('at').notNull(),
    organisationId: id('organisation_id'),
    /** Null where the product itself acted. */
    personId: id('person_id'),
    /** "revision submitted" */
    act: varchar('act', { length: 80 }).notNull(),
    subjectKind: varchar('subject_kind', { length: 40 }).notNull(),
    subjectId: varchar('subject_id', { length: 80 }).notNull(),
    detail: json('detail', z.record(z.string(), z.unknown())).notNull(),
    requestId: varchar('request_id', { length: 64 }),
  },
  (table) => [
    index('audit_organisation_at').on(table.organisationId, table.at),
    index('audit_subject').on(table.subjectKind, table.subjectId),
  ],
);
