CREATE TRIGGER note_events_append_only BEFORE UPDATE OR DELETE ON "note_events" FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER note_events_kept BEFORE TRUNCATE ON "note_events" FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
