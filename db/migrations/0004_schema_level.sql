-- How many migrations have run: readiness compares it with what the code was built for.
CREATE FUNCTION schema_level() RETURNS int
  LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, drizzle, pg_temp AS $$
  SELECT count(*)::int FROM drizzle.__drizzle_migrations
$$;--> statement-breakpoint
REVOKE ALL ON FUNCTION schema_level() FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION schema_level() TO proofplate_app;
