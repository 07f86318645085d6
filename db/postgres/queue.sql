-- The one door from a business transaction into the job queue. Run by migrate.cjs after the queue's own migrations, in one transaction,
-- as proofplate_owner; safe to run again. The queue's tables carry row-level security of their own, so only their owner can add to them.
create schema if not exists queue authorization proofplate_worker;
set local role proofplate_worker;

-- The shop comes from the transaction's setting alone and fails closed: no caller can name another shop in a payload, nor replace another
-- shop's job by its key.
create or replace function queue.enqueue_job(task text, payload jsonb, job_key text default null, delay_seconds integer default 0)
returns void
language plpgsql
security definer
set search_path = pg_catalog, pg_temp
as $$
declare
  shop uuid := current_setting('app.shop_id')::uuid;
begin
  if task !~ '^[a-z][a-z0-9-]*\.[a-z][a-z0-9-]*$' then
    raise exception 'a task is named module.verb' using errcode = '22023';
  end if;
  if jsonb_typeof(payload) <> 'object' or pg_column_size(payload) > 8192 then
    raise exception 'a payload is a small object of ids' using errcode = '22023';
  end if;
  if delay_seconds not between 0 and 86400 then
    raise exception 'a job waits a day at most' using errcode = '22023';
  end if;
  perform graphile_worker.add_job(
    task,
    (payload || jsonb_build_object('shopId', shop))::json,
    run_at => now() + make_interval(secs => delay_seconds),
    job_key => shop::text || ':' || task || ':' || job_key
  );
end
$$;

revoke all on function queue.enqueue_job(text, jsonb, text, integer) from public;
grant usage on schema queue to proofplate_app;
grant execute on function queue.enqueue_job(text, jsonb, text, integer) to proofplate_app;
