-- The roles of a cluster. Safe to run again and by two at once: the lock comes first, what exists is left alone.
-- Passwords are set by bootstrap.mjs, never here.
select pg_advisory_xact_lock(7203154001);

do $$
declare
  wanted text;
begin
  foreach wanted in array array[
    'proofplate_owner', 'proofplate_search', 'proofplate_migrator', 'proofplate_app', 'proofplate_backup', 'proofplate_worker'
  ] loop
    if not exists (select from pg_roles where rolname = wanted) then
      execute format('create role %I', wanted);
    end if;
  end loop;
end
$$;

-- Owns the database and every table in it; nobody signs in as it, so FORCEd row-level security has no side door.
alter role proofplate_owner    nologin nosuperuser nocreatedb nocreaterole nobypassrls;
-- Owns the one search function: it may read across the policies, but only the columns granted to it.
alter role proofplate_search   nologin nosuperuser nocreatedb nocreaterole bypassrls;
-- Changes the schema. It has no rights of its own until it says SET ROLE.
alter role proofplate_migrator login   nosuperuser nocreatedb nocreaterole nobypassrls noinherit;
-- The api and the worker's business transactions.
alter role proofplate_app      login   nosuperuser nocreatedb nocreaterole nobypassrls;
-- Reads everything for a backup, writes nothing.
alter role proofplate_backup   login   nosuperuser nocreatedb nocreaterole bypassrls;
-- Owns the job queue's schema and nothing else (docs/adr: the queue's tables carry row-level security of their own).
alter role proofplate_worker   login   nosuperuser nocreatedb nocreaterole nobypassrls;

alter role proofplate_backup set default_transaction_read_only = on;

grant proofplate_owner, proofplate_worker to proofplate_migrator;
-- A migration hands the search function and the enqueue function to their owners, which takes membership.
grant proofplate_search, proofplate_worker to proofplate_owner;
grant pg_read_all_data to proofplate_backup;
