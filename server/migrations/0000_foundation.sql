CREATE TABLE "blobs" (
	"digest" text PRIMARY KEY NOT NULL,
	"text" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "device_grants" (
	"device_code_hash" text PRIMARY KEY NOT NULL,
	"user_code" text NOT NULL,
	"client" text NOT NULL,
	"state" text NOT NULL,
	"person_id" uuid,
	"requested" timestamp (3) with time zone NOT NULL,
	"expires" timestamp (3) with time zone NOT NULL,
	"interval" integer NOT NULL,
	"last_polled" timestamp (3) with time zone,
	CONSTRAINT "device_grants_userCode_unique" UNIQUE("user_code")
);
--> statement-breakpoint
CREATE TABLE "person_keys" (
	"kid" text PRIMARY KEY NOT NULL,
	"person_id" uuid NOT NULL,
	"x" text NOT NULL,
	"salt" text NOT NULL,
	"sealed" text NOT NULL,
	"created" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "person_keys_personId_unique" UNIQUE("person_id")
);
--> statement-breakpoint
CREATE TABLE "events" (
	"index" integer PRIMARY KEY NOT NULL,
	"revision_id" uuid NOT NULL,
	"event" text NOT NULL,
	"person_id" uuid NOT NULL,
	"time" timestamp (3) with time zone NOT NULL,
	"note" text NOT NULL,
	"leaf" text NOT NULL,
	"leaf_hash" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "log_heads" (
	"size" integer PRIMARY KEY NOT NULL,
	"root" text NOT NULL,
	"time" timestamp (3) with time zone NOT NULL,
	"jws" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "marks" (
	"revision_id" uuid NOT NULL,
	"path" text NOT NULL,
	"digest" text NOT NULL,
	"person_id" uuid NOT NULL,
	"is_withdrawn" boolean NOT NULL,
	"time" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "marks_revision_id_path_pk" PRIMARY KEY("revision_id","path")
);
--> statement-breakpoint
CREATE TABLE "people" (
	"id" uuid PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"email_key" text NOT NULL,
	"password_hash" text NOT NULL,
	"is_demo" boolean NOT NULL,
	"created" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "people_emailKey_unique" UNIQUE("email_key")
);
--> statement-breakpoint
CREATE TABLE "sign_in_failures" (
	"account_hash" text PRIMARY KEY NOT NULL,
	"failures" integer NOT NULL,
	"locked_until" timestamp (3) with time zone,
	"last_failure" timestamp (3) with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "remarks" (
	"id" uuid PRIMARY KEY NOT NULL,
	"sheet_id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"path" text NOT NULL,
	"weight" text NOT NULL,
	"text" text NOT NULL,
	"person_id" uuid NOT NULL,
	"time" timestamp (3) with time zone NOT NULL,
	"state" text NOT NULL,
	"resolved_at" timestamp (3) with time zone,
	"resolved_by" uuid,
	"version" integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE "replies" (
	"remark_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"person_id" uuid NOT NULL,
	"text" text NOT NULL,
	"time" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "replies_remark_id_position_pk" PRIMARY KEY("remark_id","position")
);
--> statement-breakpoint
CREATE TABLE "revision_blocks" (
	"revision_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"path" text NOT NULL,
	"digest" text NOT NULL,
	CONSTRAINT "revision_blocks_revision_id_position_pk" PRIMARY KEY("revision_id","position"),
	CONSTRAINT "revision_blocks_revisionId_path_unique" UNIQUE("revision_id","path")
);
--> statement-breakpoint
CREATE TABLE "revision_files" (
	"revision_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"name" text NOT NULL,
	"digest" text NOT NULL,
	CONSTRAINT "revision_files_revision_id_position_pk" PRIMARY KEY("revision_id","position"),
	CONSTRAINT "revision_files_revisionId_name_unique" UNIQUE("revision_id","name")
);
--> statement-breakpoint
CREATE TABLE "revisions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"sheet_id" uuid NOT NULL,
	"ordinal" integer NOT NULL,
	"letter" text NOT NULL,
	"title" text NOT NULL,
	"author_id" uuid NOT NULL,
	"pushed" timestamp (3) with time zone NOT NULL,
	"state" text NOT NULL,
	"state_since" timestamp (3) with time zone NOT NULL,
	"manifest" text NOT NULL,
	"manifest_digest" text NOT NULL,
	"report_digest" text NOT NULL,
	"passed" integer NOT NULL,
	"failed" integer NOT NULL,
	"holds" integer NOT NULL,
	"governing_path" text,
	"governing_label" text,
	"governing_utilisation" double precision,
	CONSTRAINT "revisions_sheetId_ordinal_unique" UNIQUE("sheet_id","ordinal")
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"secret_hash" text PRIMARY KEY NOT NULL,
	"person_id" uuid NOT NULL,
	"csrf" text NOT NULL,
	"created" timestamp (3) with time zone NOT NULL,
	"last_seen" timestamp (3) with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "settings" (
	"name" text PRIMARY KEY NOT NULL,
	"value" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "sheets" (
	"id" uuid PRIMARY KEY NOT NULL,
	"study_id" text NOT NULL,
	"number" text NOT NULL,
	"created" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "sheets_studyId_number_unique" UNIQUE("study_id","number")
);
--> statement-breakpoint
CREATE TABLE "signatures" (
	"id" uuid PRIMARY KEY NOT NULL,
	"revision_id" uuid NOT NULL,
	"role" text NOT NULL,
	"person_id" uuid NOT NULL,
	"kid" text NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"meaning" text NOT NULL,
	"time" timestamp (3) with time zone NOT NULL,
	"jws" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "studies" (
	"id" text PRIMARY KEY NOT NULL,
	"title" text NOT NULL,
	"place" text NOT NULL,
	"created" timestamp (3) with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "study_members" (
	"study_id" text NOT NULL,
	"person_id" uuid NOT NULL,
	"role" text NOT NULL,
	CONSTRAINT "study_members_study_id_person_id_role_pk" PRIMARY KEY("study_id","person_id","role")
);
--> statement-breakpoint
CREATE TABLE "access_tokens" (
	"id" uuid PRIMARY KEY NOT NULL,
	"person_id" uuid NOT NULL,
	"label" text NOT NULL,
	"secret_hash" text NOT NULL,
	"created" timestamp (3) with time zone NOT NULL,
	"last_used" timestamp (3) with time zone,
	CONSTRAINT "access_tokens_secretHash_unique" UNIQUE("secret_hash")
);
--> statement-breakpoint
ALTER TABLE "device_grants" ADD CONSTRAINT "device_grants_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "person_keys" ADD CONSTRAINT "person_keys_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "events" ADD CONSTRAINT "events_revision_id_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "events" ADD CONSTRAINT "events_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "marks" ADD CONSTRAINT "marks_revision_id_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "marks" ADD CONSTRAINT "marks_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "remarks" ADD CONSTRAINT "remarks_sheet_id_sheets_id_fk" FOREIGN KEY ("sheet_id") REFERENCES "public"."sheets"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "remarks" ADD CONSTRAINT "remarks_revision_id_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "remarks" ADD CONSTRAINT "remarks_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "remarks" ADD CONSTRAINT "remarks_resolved_by_people_id_fk" FOREIGN KEY ("resolved_by") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "replies" ADD CONSTRAINT "replies_remark_id_remarks_id_fk" FOREIGN KEY ("remark_id") REFERENCES "public"."remarks"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "replies" ADD CONSTRAINT "replies_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_blocks" ADD CONSTRAINT "revision_blocks_revision_id_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_files" ADD CONSTRAINT "revision_files_revision_id_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_files" ADD CONSTRAINT "revision_files_digest_blobs_digest_fk" FOREIGN KEY ("digest") REFERENCES "public"."blobs"("digest") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_sheet_id_sheets_id_fk" FOREIGN KEY ("sheet_id") REFERENCES "public"."sheets"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_author_id_people_id_fk" FOREIGN KEY ("author_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_report_digest_blobs_digest_fk" FOREIGN KEY ("report_digest") REFERENCES "public"."blobs"("digest") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sheets" ADD CONSTRAINT "sheets_study_id_studies_id_fk" FOREIGN KEY ("study_id") REFERENCES "public"."studies"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "signatures" ADD CONSTRAINT "signatures_revision_id_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "signatures" ADD CONSTRAINT "signatures_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "signatures" ADD CONSTRAINT "signatures_kid_person_keys_kid_fk" FOREIGN KEY ("kid") REFERENCES "public"."person_keys"("kid") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "study_members" ADD CONSTRAINT "study_members_study_id_studies_id_fk" FOREIGN KEY ("study_id") REFERENCES "public"."studies"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "study_members" ADD CONSTRAINT "study_members_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "access_tokens" ADD CONSTRAINT "access_tokens_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "events_revision_id_index" ON "events" USING btree ("revision_id");--> statement-breakpoint
CREATE INDEX "remarks_sheet_id_index" ON "remarks" USING btree ("sheet_id");--> statement-breakpoint
CREATE INDEX "sessions_last_seen_index" ON "sessions" USING btree ("last_seen");--> statement-breakpoint
CREATE INDEX "signatures_revision_id_index" ON "signatures" USING btree ("revision_id");--> statement-breakpoint
CREATE INDEX "access_tokens_person_id_index" ON "access_tokens" USING btree ("person_id");