CREATE TRIGGER verdicts_append_only BEFORE UPDATE OR DELETE ON "verdicts" FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER verdicts_kept BEFORE TRUNCATE ON "verdicts" FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
