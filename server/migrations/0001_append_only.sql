-- What is recorded stays as it was written: the rules that a table definition cannot express.

CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION 'rows of % never change', TG_TABLE_NAME USING ERRCODE = 'restrict_violation';
END $$;
--> statement-breakpoint
CREATE TRIGGER blobs_append_only BEFORE UPDATE OR DELETE ON "blobs" FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER blobs_no_truncate BEFORE TRUNCATE ON "blobs" EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER revision_files_append_only BEFORE UPDATE OR DELETE ON "revision_files" FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER revision_files_no_truncate BEFORE TRUNCATE ON "revision_files" EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER revision_blocks_append_only BEFORE UPDATE OR DELETE ON "revision_blocks" FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER revision_blocks_no_truncate BEFORE TRUNCATE ON "revision_blocks" EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER signatures_append_only BEFORE UPDATE OR DELETE ON "signatures" FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER signatures_no_truncate BEFORE TRUNCATE ON "signatures" EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER events_append_only BEFORE UPDATE OR DELETE ON "events" FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER events_no_truncate BEFORE TRUNCATE ON "events" EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER log_heads_append_only BEFORE UPDATE OR DELETE ON "log_heads" FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER log_heads_no_truncate BEFORE TRUNCATE ON "log_heads" EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER revisions_no_delete BEFORE DELETE ON "revisions" FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER revisions_no_truncate BEFORE TRUNCATE ON "revisions" EXECUTE FUNCTION refuse_change();
--> statement-breakpoint

-- Of a revision only the state moves; a column added later is covered without a change here.
CREATE FUNCTION refuse_revision_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF to_jsonb(NEW) - 'state' - 'state_since' IS DISTINCT FROM to_jsonb(OLD) - 'state' - 'state_since' THEN
    RAISE EXCEPTION 'of a revision only its state moves' USING ERRCODE = 'restrict_violation';
  END IF;
  RETURN NEW;
END $$;
--> statement-breakpoint
CREATE TRIGGER revisions_immutable BEFORE UPDATE ON "revisions" FOR EACH ROW EXECUTE FUNCTION refuse_revision_change();
--> statement-breakpoint

-- The state of a revision is what its last event made it. Looked at when the transaction ends, since both are written in it.
CREATE FUNCTION check_revision_state() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE
  recorded text;
  current_state text;
BEGIN
  SELECT "state" INTO current_state FROM "revisions" WHERE "id" = NEW."id";
  SELECT CASE "event" WHEN 'handed over' THEN 'in check' ELSE "event" END INTO recorded
    FROM "events" WHERE "revision_id" = NEW."id" ORDER BY "index" DESC LIMIT 1;
  IF recorded IS DISTINCT FROM current_state THEN
    RAISE EXCEPTION 'the state % of a revision is not that of its last event', current_state USING ERRCODE = 'restrict_violation';
  END IF;
  RETURN NULL;
END $$;
--> statement-breakpoint
CREATE CONSTRAINT TRIGGER revisions_state_by_event AFTER INSERT OR UPDATE ON "revisions"
  DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION check_revision_state();
--> statement-breakpoint

-- The log is numbered from 0 without gaps.
CREATE FUNCTION check_event_index() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF NEW."index" <> (SELECT coalesce(max("index") + 1, 0) FROM "events") THEN
    RAISE EXCEPTION 'event % does not follow the last one', NEW."index" USING ERRCODE = 'restrict_violation';
  END IF;
  RETURN NEW;
END $$;
--> statement-breakpoint
CREATE TRIGGER events_without_gaps BEFORE INSERT ON "events" FOR EACH ROW EXECUTE FUNCTION check_event_index();
