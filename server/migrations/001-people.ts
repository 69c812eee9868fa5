import { RUNTIME_ROLE } from '../config/database.ts'
import { protect, type Migration, type MigrationContext } from './tenancy.ts'

/** What the operator runs when the application's own account may not make roles. */
const roleSql = (user: string): string => `create role ${RUNTIME_ROLE} nologin nosuperuser nobypassrls; grant ${RUNTIME_ROLE} to "${user}";`

/**
 * The role that requests run as. Roles belong to the whole server, so another database may have made it already.
 * @throws Error with the SQL to run as a superuser when this account may not
 */
async function ensureRuntimeRole({ query, transaction }: MigrationContext): Promise<void> {
  try {
    await query(
      `do $$ begin
         if not exists (select from pg_roles where rolname = '${RUNTIME_ROLE}') then
           begin
             create role ${RUNTIME_ROLE} nologin nosuperuser nobypassrls;
           exception when duplicate_object or unique_violation then null;
           end;
         end if;
         if not pg_has_role(current_user, '${RUNTIME_ROLE}', 'member') then
           execute format('grant ${RUNTIME_ROLE} to %I', current_user);
         end if;
       end $$`,
      { transaction },
    )
  } catch (error) {
    const code = (error as { original?: { code?: string } }).original?.code
    if (code !== '42501' && code !== '42704') throw error
    throw new Error(`The database account may not make the role that requests run as. Run this once as a superuser, with the account's name, and start again:\n  ${roleSql('your-account')}`, { cause: error })
  }
}

const sql = `
  create table organizations (
    id uuid primary key,
    organization_id uuid not null generated always as (id) stored,
    name text not null check (length(name) between 1 and 160),
    address text not null default '',
    default_unit_system text not null default 'SI' check (default_unit_system in ('SI', 'US')),
    version integer not null default 1,
    created_at timestamptz(3) not null default now()
  );
  ${protect('organizations', 'select, insert, update')}

  create table people (
    id uuid primary key,
    organization_id uuid not null references organizations (id),
    name text not null,
    email text not null,
    roles text[] not null check (cardinality(roles) > 0 and roles <@ array['administrator', 'engineer', 'inspector', 'supervisor', 'welder', 'auditor']),
    password_hash text,
    state text not null default 'invited' check (state in ('invited', 'active', 'inactive')),
    unit_system text not null default 'SI' check (unit_system in ('SI', 'US')),
    theme text not null default 'day' check (theme in ('day', 'night')),
    -- Raised to end every session at once: a session carries the epoch in which it began.
    session_epoch integer not null default 1,
    version integer not null default 1,
    created_at timestamptz(3) not null default now(),
    last_sign_in_at timestamptz(3),
    unique (organization_id, id),
    check (state <> 'active' or password_hash is not null)
  );
  -- One account an address over the whole installation: sign-in names no organization.
  create unique index people_email on people (lower(email));
  create index people_name on people (organization_id, name, id);
  ${protect('people', 'select, insert, update')}

  create table person_tokens (
    id uuid primary key,
    organization_id uuid not null,
    person_id uuid not null,
    kind text not null check (kind in ('invite', 'reset')),
    token_sha256 bytea not null unique,
    expires_at timestamptz(3) not null,
    used_at timestamptz(3),
    created_at timestamptz(3) not null default now(),
    foreign key (organization_id, person_id) references people (organization_id, id)
  );
  create index person_tokens_person on person_tokens (organization_id, person_id);
  ${protect('person_tokens')}

  -- Who tried, for throttling. The organization is known only when the address is that of a person.
  create table sign_in_attempts (
    id bigint generated always as identity primary key,
    organization_id uuid references organizations (id),
    kind text not null check (kind in ('sign-in', 'reset', 'confirm')),
    email text not null,
    address text not null,
    succeeded boolean not null default false,
    at timestamptz not null default now()
  );
  create index sign_in_attempts_email on sign_in_attempts (kind, email, at);
  create index sign_in_attempts_address on sign_in_attempts (kind, address, at);
  ${protect('sign_in_attempts', 'select')}

  create table session (
    sid varchar primary key,
    sess json not null,
    expire timestamp(6) not null,
    organization_id uuid generated always as ((sess -> 'passport' -> 'user' ->> 'organizationId')::uuid) stored,
    person_id uuid generated always as ((sess -> 'passport' -> 'user' ->> 'id')::uuid) stored
  );
  create index session_expire on session (expire);
  create index session_person on session (organization_id, person_id);
  ${protect('session', 'select (sid, organization_id, person_id, expire), delete')}

  create table outbox_mails (
    id uuid primary key,
    organization_id uuid not null references organizations (id),
    recipients text[] not null check (cardinality(recipients) > 0),
    subject text not null,
    text text not null,
    -- Mail that holds a private link is for administrators' eyes only; the link leaves the row once sent.
    kind text not null default 'document' check (kind in ('document', 'account')),
    link text,
    state text not null default 'queued' check (state in ('queued', 'sent', 'caught', 'failed')),
    attempts integer not null default 0,
    error text,
    created_at timestamptz(3) not null default now(),
    sent_at timestamptz(3),
    unique (organization_id, id)
  );
  create index outbox_mails_created on outbox_mails (organization_id, created_at, id);
  ${protect('outbox_mails')}

  create table outbox_attachments (
    organization_id uuid not null,
    mail_id uuid not null,
    position integer not null check (position >= 0),
    name text not null,
    media_type text not null,
    bytes bytea not null,
    primary key (mail_id, position),
    foreign key (organization_id, mail_id) references outbox_mails (organization_id, id) on delete cascade
  );
  ${protect('outbox_attachments', 'select, insert, delete')}
`

/** Organizations, people, their sessions and links, and the outbox. */
export const m001: Migration = {
  up: async (context) => {
    await ensureRuntimeRole(context)
    await context.query(sql, { transaction: context.transaction })
  },
}
