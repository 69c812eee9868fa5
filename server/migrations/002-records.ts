import { guards } from './records-guards.ts'
import { protect, type Migration } from './tenancy.ts'

/** Columns that rules and lists search; computed from the content by services/projections.ts in the same transaction. */
const projections = `
  title text not null,
  processes text[] not null default '{}',
  metals text[] not null default '{}',
  metals_label text not null default '',
  positions text[] not null default '{}',
  standards text[] not null default '{}',
  weld text not null default 'groove',
  thickness_min double precision,
  thickness_max double precision,
  thickness numrange generated always as (
    case when thickness_min is null and thickness_max is null then null
         when thickness_min > thickness_max then null
         else numrange(thickness_min::numeric, thickness_max::numeric, '[]') end) stored,
  diameter_min double precision,
  diameter_max double precision,
  diameter numrange generated always as (
    case when diameter_min is null and diameter_max is null then null
         when diameter_min > diameter_max then null
         else numrange(diameter_min::numeric, diameter_max::numeric, '[]') end) stored`

const tables = `
create table number_series (
  organization_id uuid not null references organizations(id),
  series text not null,
  last integer not null,
  primary key (organization_id, series)
);

create table library_items (
  id uuid primary key default gen_random_uuid(),
  organization_id uuid not null references organizations(id),
  kind text not null check (kind in ('base-metals', 'filler-metals', 'gases', 'positions', 'processes')),
  key text not null,
  title text not null,
  subtitle text not null default '',
  -- All that the row is found by, parted by bars: grade, UNS, P-Number, group, classification.
  search text not null,
  ordinal integer not null default 0,
  origin text not null check (origin in ('reference', 'own')),
  basis text,
  source text,
  content jsonb not null,
  version integer not null default 1,
  unique (organization_id, id),
  unique (organization_id, kind, key)
);
create index library_items_order on library_items (organization_id, kind, ordinal, id);

create table procedures (
  id uuid primary key default gen_random_uuid(),
  organization_id uuid not null references organizations(id),
  number text not null,
  created_by uuid not null,
  created_at timestamptz(3) not null default now(),
  unique (organization_id, id),
  unique (organization_id, number),
  foreign key (organization_id, created_by) references people (organization_id, id)
);

create table procedure_revisions (
  id uuid primary key default gen_random_uuid(),
  organization_id uuid not null references organizations(id),
  procedure_id uuid not null,
  number text not null,
  revision text not null,
  ordinal integer not null check (ordinal > 0),
  state text not null check (state in ('draft', 'in-review', 'approved', 'superseded', 'withdrawn')),
  content jsonb not null,
  content_sha256 text not null,
  version integer not null default 1,
  author_id uuid not null,
  -- Everybody who saved this revision; none of them may approve it.
  contributors uuid[] not null default '{}',
  deviation_reason text,
  ${projections},
  created_at timestamptz(3) not null default clock_timestamp(),
  updated_at timestamptz(3) not null default clock_timestamp(),
  submitted_at timestamptz(3),
  decided_at timestamptz(3),
  unique (organization_id, id),
  unique (organization_id, procedure_id, ordinal),
  foreign key (organization_id, procedure_id) references procedures (organization_id, id),
  foreign key (organization_id, author_id) references people (organization_id, id)
);
create unique index one_approved_revision on procedure_revisions (procedure_id) where state = 'approved';
create unique index one_open_revision on procedure_revisions (procedure_id) where state in ('draft', 'in-review');
create index revisions_newest on procedure_revisions (organization_id, procedure_id, ordinal desc);
create index revisions_state on procedure_revisions (organization_id, state);
create index revisions_processes on procedure_revisions using gin (processes);
create index revisions_metals on procedure_revisions using gin (metals);
create index revisions_positions on procedure_revisions using gin (positions);
create index revisions_standards on procedure_revisions using gin (standards);
create index revisions_thickness on procedure_revisions using gist (thickness);
create index revisions_diameter on procedure_revisions using gist (diameter);

create table coupons (
  id uuid primary key default gen_random_uuid(),
  organization_id uuid not null references organizations(id),
  number text not null,
  state text not null check (state in ('planned', 'welding', 'testing', 'certified', 'rejected')),
  revision_id uuid,
  content jsonb not null,
  content_sha256 text not null,
  version integer not null default 1,
  inspector_id uuid not null,
  ${projections},
  welded_on date,
  created_at timestamptz(3) not null default clock_timestamp(),
  updated_at timestamptz(3) not null default clock_timestamp(),
  decided_at timestamptz(3),
  unique (organization_id, id),
  unique (organization_id, number),
  foreign key (organization_id, revision_id) references procedure_revisions (organization_id, id),
  foreign key (organization_id, inspector_id) references people (organization_id, id)
);
create index coupons_state on coupons (organization_id, state);
create index coupons_revision on coupons (organization_id, revision_id);
create index coupons_processes on coupons using gin (processes);
create index coupons_thickness on coupons using gist (thickness);

-- The coupons that a revision rests on; rows follow the revision's content and are closed with it.
create table revision_coupons (
  organization_id uuid not null references organizations(id),
  revision_id uuid not null,
  coupon_id uuid not null,
  ordinal integer not null,
  primary key (revision_id, coupon_id),
  foreign key (organization_id, revision_id) references procedure_revisions (organization_id, id) on delete cascade,
  foreign key (organization_id, coupon_id) references coupons (organization_id, id)
);
create index revision_coupons_coupon on revision_coupons (organization_id, coupon_id);

create table photos (
  id uuid primary key default gen_random_uuid(),
  organization_id uuid not null references organizations(id),
  coupon_id uuid not null,
  storage_key text not null,
  thumbnail_key text,
  file_name text not null,
  media_type text not null,
  bytes integer not null check (bytes > 0),
  sha256 text not null,
  width integer,
  height integer,
  caption text not null default '',
  tag text not null default '',
  taken_at timestamptz(3),
  uploaded_at timestamptz(3) not null default clock_timestamp(),
  uploaded_by uuid not null,
  unique (organization_id, id),
  foreign key (organization_id, coupon_id) references coupons (organization_id, id),
  foreign key (organization_id, uploaded_by) references people (organization_id, id)
);
create index photos_coupon on photos (organization_id, coupon_id, uploaded_at);

create table signatures (
  id uuid primary key default gen_random_uuid(),
  organization_id uuid not null references organizations(id),
  revision_id uuid,
  coupon_id uuid,
  person_id uuid not null,
  person_name text not null,
  role text not null,
  meaning text not null check (meaning in ('authored', 'reviewed', 'approved', 'certified', 'withdrawn', 'rejected', 'returned')),
  statement text not null,
  reason text,
  content_sha256 text not null,
  signed_at timestamptz(3) not null default clock_timestamp(),
  check (num_nonnulls(revision_id, coupon_id) = 1),
  unique (organization_id, id),
  foreign key (organization_id, revision_id) references procedure_revisions (organization_id, id),
  foreign key (organization_id, coupon_id) references coupons (organization_id, id),
  foreign key (organization_id, person_id) references people (organization_id, id)
);
create index signatures_revision on signatures (organization_id, revision_id, signed_at);
create index signatures_coupon on signatures (organization_id, coupon_id, signed_at);

create table documents (
  id uuid primary key default gen_random_uuid(),
  organization_id uuid not null references organizations(id),
  revision_id uuid,
  coupon_id uuid,
  -- What the paper says of the record's state: a withdrawn revision prints differently from the approved one.
  record_state text not null,
  paper text not null check (paper in ('A4', 'Letter')),
  units text not null check (units in ('SI', 'US', 'both')),
  storage_key text not null,
  file_name text not null,
  sha256 text not null,
  bytes integer not null,
  signed_at timestamptz(3) not null,
  created_at timestamptz(3) not null default clock_timestamp(),
  check (num_nonnulls(revision_id, coupon_id) = 1),
  unique (organization_id, id),
  foreign key (organization_id, revision_id) references procedure_revisions (organization_id, id),
  foreign key (organization_id, coupon_id) references coupons (organization_id, id)
);
create unique index one_document_of_revision on documents (revision_id, record_state, paper, units) where revision_id is not null;
create unique index one_document_of_coupon on documents (coupon_id, record_state, paper, units) where coupon_id is not null;

create table jobs (
  id uuid primary key default gen_random_uuid(),
  organization_id uuid not null references organizations(id),
  number text not null,
  title text not null,
  customer text not null default '',
  code text not null default '',
  toughness_required boolean not null default false,
  notes text not null default '',
  version integer not null default 1,
  created_at timestamptz(3) not null default clock_timestamp(),
  updated_at timestamptz(3) not null default clock_timestamp(),
  unique (organization_id, id),
  unique (organization_id, number)
);

create table job_joints (
  id uuid primary key default gen_random_uuid(),
  organization_id uuid not null references organizations(id),
  job_id uuid not null,
  ordinal integer not null,
  number text not null,
  mark text,
  metal_a text,
  metal_b text,
  process text,
  weld text not null,
  product text not null,
  thickness jsonb,
  diameter jsonb,
  position text,
  length text,
  count integer not null check (count > 0),
  revision_id uuid,
  unique (organization_id, id),
  -- Two joints may trade numbers in one save.
  unique (organization_id, job_id, number) deferrable initially deferred,
  foreign key (organization_id, job_id) references jobs (organization_id, id) on delete cascade,
  foreign key (organization_id, revision_id) references procedure_revisions (organization_id, id)
);
create index job_joints_job on job_joints (organization_id, job_id, ordinal);
create index job_joints_revision on job_joints (organization_id, revision_id);

create table signing_certificates (
  id uuid primary key default gen_random_uuid(),
  organization_id uuid not null references organizations(id),
  -- PKCS #12, closed with SIGNING_PASSPHRASE
  p12 bytea not null,
  created_at timestamptz(3) not null default now(),
  unique (organization_id)
);
`

const all = 'select, insert, update, delete'
const grants: Record<string, string> = {
  number_series: 'select, insert, update',
  library_items: all,
  procedures: all,
  procedure_revisions: all,
  coupons: all,
  revision_coupons: all,
  photos: all,
  signatures: 'select, insert',
  documents: 'select, insert',
  jobs: all,
  job_joints: all,
  signing_certificates: 'select, insert',
}

/** Records: library, procedures and their revisions, coupons, photos, signatures, released documents, jobs. */
export const m002: Migration = {
  up: async ({ query, transaction }) => {
    await query(tables, { transaction })
    for (const [table, granted] of Object.entries(grants)) await query(protect(table, granted), { transaction })
    await query(guards, { transaction })
  },
}
