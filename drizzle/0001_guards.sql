CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
	RAISE EXCEPTION '% is never changed: % refused', TG_TABLE_NAME, TG_OP USING ERRCODE = 'restrict_violation';
END
$$;
--> statement-breakpoint
CREATE TRIGGER scene_versions_immutable BEFORE UPDATE OR DELETE ON "scene_versions" FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER scene_versions_kept BEFORE TRUNCATE ON "scene_versions" FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER audit_log_append_only BEFORE UPDATE OR DELETE ON "audit_log" FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER audit_log_kept BEFORE TRUNCATE ON "audit_log" FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
ALTER TABLE "scenes" ADD CONSTRAINT "scenes_head_exists" FOREIGN KEY ("id", "head_version") REFERENCES "scene_versions" ("scene_id", "number") DEFERRABLE INITIALLY DEFERRED;
