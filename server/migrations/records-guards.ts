/**
 * What must never be wrong, whatever code runs above: released records don't change, history is only added to.
 * Violations raise SB001, which the API answers as 409 with the sentence given here.
 */
const revisionGuard = `
create function guard_revision() returns trigger language plpgsql as $fn$
begin
  if tg_op = 'INSERT' then
    if new.state <> 'draft' then
      raise exception using errcode = 'SB001', message = 'A revision starts as a draft.';
    end if;
    return new;
  end if;
  if tg_op = 'DELETE' then
    if old.state <> 'draft' then
      raise exception using errcode = 'SB001', message = format('%s revision %s is %s and stays on record.', old.number, old.revision, old.state);
    end if;
    return old;
  end if;
  if row(new.id, new.organization_id, new.procedure_id, new.number, new.revision, new.ordinal, new.created_at)
     is distinct from row(old.id, old.organization_id, old.procedure_id, old.number, old.revision, old.ordinal, old.created_at) then
    raise exception using errcode = 'SB001', message = format('The number and revision letter of %s revision %s do not change.', old.number, old.revision);
  end if;
  if new.state <> old.state and not (old.state, new.state) in
     (('draft', 'in-review'), ('in-review', 'draft'), ('in-review', 'approved'), ('approved', 'superseded'), ('approved', 'withdrawn')) then
    raise exception using errcode = 'SB001', message = format('%s revision %s is %s and cannot become %s.', old.number, old.revision, old.state, new.state);
  end if;
  -- Under review the text stands still, so that what is signed is what was read.
  if old.state <> 'draft' and row(new.content, new.content_sha256, new.author_id, new.contributors, new.title, new.processes, new.metals, new.metals_label, new.positions, new.standards, new.weld, new.thickness_min, new.thickness_max, new.diameter_min, new.diameter_max, new.submitted_at)
     is distinct from row(old.content, old.content_sha256, old.author_id, old.contributors, old.title, old.processes, old.metals, old.metals_label, old.positions, old.standards, old.weld, old.thickness_min, old.thickness_max, old.diameter_min, old.diameter_max, old.submitted_at)
     and not (old.state = 'in-review' and new.state = 'draft') then
    raise exception using errcode = 'SB001', message = format('%s revision %s is %s; its content does not change. Open the next revision instead.', old.number, old.revision, old.state);
  end if;
  if old.state in ('approved', 'superseded', 'withdrawn') and new.deviation_reason is distinct from old.deviation_reason then
    raise exception using errcode = 'SB001', message = format('%s revision %s is %s; the reason given at approval does not change.', old.number, old.revision, old.state);
  end if;
  if old.state in ('superseded', 'withdrawn') then
    raise exception using errcode = 'SB001', message = format('%s revision %s is %s and is closed.', old.number, old.revision, old.state);
  end if;
  return new;
end $fn$;
create trigger guard_revision before insert or update or delete on procedure_revisions for each row execute function guard_revision();

create function guard_revision_coupon() returns trigger language plpgsql as $fn$
declare
  held text;
begin
  select state into held from procedure_revisions where id = coalesce(new.revision_id, old.revision_id) for share;
  -- No row: the draft itself is being discarded.
  if held is not null and held <> 'draft' then
    raise exception using errcode = 'SB001', message = format('The revision is %s; the coupons that support it do not change.', held);
  end if;
  if tg_op = 'DELETE' then return old; end if;
  return new;
end $fn$;
create trigger guard_revision_coupon before insert or update or delete on revision_coupons for each row execute function guard_revision_coupon();
`

const couponGuard = `
create function guard_coupon() returns trigger language plpgsql as $fn$
begin
  if tg_op = 'INSERT' then
    if new.state in ('certified', 'rejected') then
      raise exception using errcode = 'SB001', message = 'A coupon is certified or rejected by signature, not at the start.';
    end if;
    return new;
  end if;
  if old.state in ('certified', 'rejected') then
    raise exception using errcode = 'SB001', message = format('%s is %s and is closed.', old.number, old.state);
  end if;
  if tg_op = 'DELETE' then return old; end if;
  if row(new.id, new.organization_id, new.number, new.created_at) is distinct from row(old.id, old.organization_id, old.number, old.created_at) then
    raise exception using errcode = 'SB001', message = format('The number of %s does not change.', old.number);
  end if;
  return new;
end $fn$;
create trigger guard_coupon before insert or update or delete on coupons for each row execute function guard_coupon();

create function guard_photo() returns trigger language plpgsql as $fn$
declare
  held record;
begin
  select number, state into held from coupons where id = case when tg_op = 'INSERT' then new.coupon_id else old.coupon_id end for share;
  if held.state in ('certified', 'rejected') then
    raise exception using errcode = 'SB001', message = format('%s is %s; its photos are part of the record and do not change.', held.number, held.state);
  end if;
  if tg_op = 'DELETE' then return old; end if;
  if tg_op = 'UPDATE' and row(new.id, new.organization_id, new.coupon_id, new.storage_key, new.sha256, new.bytes, new.media_type, new.file_name, new.uploaded_at, new.uploaded_by)
     is distinct from row(old.id, old.organization_id, old.coupon_id, old.storage_key, old.sha256, old.bytes, old.media_type, old.file_name, old.uploaded_at, old.uploaded_by) then
    raise exception using errcode = 'SB001', message = 'A photo keeps its file; only the caption and tag change.';
  end if;
  return new;
end $fn$;
create trigger guard_photo before insert or update or delete on photos for each row execute function guard_photo();
`

const appendOnly = `
create function guard_history() returns trigger language plpgsql as $fn$
begin
  raise exception using errcode = 'SB001', message = format('Rows of %s are only added, never changed or removed.', tg_table_name);
end $fn$;
create trigger guard_history before update or delete on signatures for each row execute function guard_history();
create trigger guard_history before update or delete on documents for each row execute function guard_history();
`

export const guards = `${revisionGuard}${couponGuard}${appendOnly}`
