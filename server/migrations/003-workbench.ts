import { protect, type Migration } from './tenancy.ts'

const tables = `
create table machines (
  id uuid primary key default gen_random_uuid(),
  organization_id uuid not null references organizations(id),
  number text not null,
  name text not null,
  location text not null default '',
  retired boolean not null default false,
  calibration_due_on date,
  content jsonb not null,
  version integer not null default 1,
  created_at timestamptz(3) not null default clock_timestamp(),
  updated_at timestamptz(3) not null default clock_timestamp(),
  -- The due date of which the last reminder went out, so that each is sent once.
  reminded_due_on date,
  unique (organization_id, id),
  unique (organization_id, number)
);
create index machines_due on machines (organization_id, calibration_due_on) where not retired;

create table heats (
  id uuid primary key default gen_random_uuid(),
  organization_id uuid not null references organizations(id),
  kind text not null check (kind in ('heat', 'lot')),
  number text not null,
  grade text not null,
  library_key text,
  content jsonb not null,
  version integer not null default 1,
  created_at timestamptz(3) not null default clock_timestamp(),
  updated_at timestamptz(3) not null default clock_timestamp(),
  unique (organization_id, id),
  unique (organization_id, kind, number, grade)
);
create index heats_library on heats (organization_id, library_key);

create table trials (
  id uuid primary key default gen_random_uuid(),
  organization_id uuid not null references organizations(id),
  number text not null,
  title text not null,
  goal text,
  procedure_id uuid,
  created_by uuid not null,
  version integer not null default 1,
  created_at timestamptz(3) not null default clock_timestamp(),
  updated_at timestamptz(3) not null default clock_timestamp(),
  unique (organization_id, id),
  unique (organization_id, number),
  foreign key (organization_id, procedure_id) references procedures (organization_id, id),
  foreign key (organization_id, created_by) references people (organization_id, id)
);

create table beads (
  id uuid primary key default gen_random_uuid(),
  organization_id uuid not null references organizations(id),
  trial_id uuid not null,
  number integer not null check (number > 0),
  machine_id uuid,
  score integer check (score between 1 and 5),
  content jsonb not null,
  version integer not null default 1,
  welded_by uuid not null,
  welded_at timestamptz(3) not null default clock_timestamp(),
  updated_at timestamptz(3) not null default clock_timestamp(),
  unique (organization_id, id),
  unique (organization_id, trial_id, number),
  foreign key (organization_id, trial_id) references trials (organization_id, id) on delete cascade,
  foreign key (organization_id, machine_id) references machines (organization_id, id),
  foreign key (organization_id, welded_by) references people (organization_id, id)
);

-- Papers and pictures that belong to a machine (calibration), a heat or lot (certificate) or a bead (photo).
create table attachments (
  id uuid primary key default gen_random_uuid(),
  organization_id uuid not null references organizations(id),
  machine_id uuid,
  heat_id uuid,
  bead_id uuid,
  storage_key text not null,
  thumbnail_key text,
  file_name text not null,
  media_type text not null,
  bytes integer not null check (bytes > 0),
  sha256 text not null,
  width integer,
  height integer,
  uploaded_at timestamptz(3) not null default clock_timestamp(),
  uploaded_by uuid not null,
  check (num_nonnulls(machine_id, heat_id, bead_id) = 1),
  unique (organization_id, id),
  foreign key (organization_id, machine_id) references machines (organization_id, id) on delete cascade,
  foreign key (organization_id, heat_id) references heats (organization_id, id) on delete cascade,
  foreign key (organization_id, bead_id) references beads (organization_id, id) on delete cascade,
  foreign key (organization_id, uploaded_by) references people (organization_id, id)
);
create index attachments_machine on attachments (organization_id, machine_id) where machine_id is not null;
create index attachments_heat on attachments (organization_id, heat_id) where heat_id is not null;
create index attachments_bead on attachments (organization_id, bead_id) where bead_id is not null;

create table arc_recordings (
  id uuid primary key default gen_random_uuid(),
  organization_id uuid not null references organizations(id),
  storage_key text not null,
  file_name text not null,
  bytes bigint not null check (bytes > 0),
  sha256 text not null,
  layout jsonb not null,
  figures jsonb not null,
  plot jsonb not null,
  coupon_id uuid,
  -- Row of the coupon's run sheet.
  run_row_id text,
  bead_id uuid,
  weld_length double precision check (weld_length > 0),
  version integer not null default 1,
  uploaded_by uuid not null,
  uploaded_at timestamptz(3) not null default clock_timestamp(),
  check (num_nonnulls(coupon_id, bead_id) <= 1),
  check (run_row_id is null or coupon_id is not null),
  unique (organization_id, id),
  foreign key (organization_id, coupon_id) references coupons (organization_id, id),
  foreign key (organization_id, bead_id) references beads (organization_id, id),
  foreign key (organization_id, uploaded_by) references people (organization_id, id)
);
create index arc_recordings_coupon on arc_recordings (organization_id, coupon_id) where coupon_id is not null;
create index arc_recordings_bead on arc_recordings (organization_id, bead_id) where bead_id is not null;
`

const all = 'select, insert, update, delete'

/** The workbench: machines, heats and lots, trial beads, their papers, arc recordings. */
export const m003: Migration = {
  up: async ({ query, transaction }) => {
    await query(tables, { transaction })
    for (const table of ['machines', 'heats', 'trials', 'beads', 'attachments', 'arc_recordings']) await query(protect(table, all), { transaction })
  },
}
