CREATE TYPE "public"."checklist_answer" AS ENUM('yes', 'no', 'does-not-apply');--> statement-breakpoint
CREATE TYPE "public"."note_kind" AS ENUM('error', 'question', 'suggestion', 'remark');--> statement-breakpoint
CREATE TYPE "public"."note_state" AS ENUM('open', 'settled');--> statement-breakpoint
CREATE TYPE "public"."review_end" AS ENUM('answered', 'called-off', 'replaced', 'overtaken', 'withdrawn');--> statement-breakpoint
CREATE TYPE "public"."verdict_word" AS ENUM('approve', 'approve-with-remarks', 'ask-for-changes', 'comment');--> statement-breakpoint
CREATE TYPE "public"."version_state" AS ENUM('draft', 'in-review', 'changes-asked', 'approved', 'approved-with-remarks', 'superseded', 'withdrawn');--> statement-breakpoint
CREATE TABLE "checklist_answers" (
	"request_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"item" integer NOT NULL,
	"answer" "checklist_answer" NOT NULL,
	"words" text NOT NULL,
	"answered_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "checklist_answers_request_id_user_id_item_pk" PRIMARY KEY("request_id","user_id","item"),
	CONSTRAINT "checklist_answers_item" CHECK ("checklist_answers"."item" >= 0),
	CONSTRAINT "checklist_answers_words" CHECK (length("checklist_answers"."words") <= 500),
	CONSTRAINT "checklist_answers_no" CHECK ("checklist_answers"."answer" <> 'no' or "checklist_answers"."words" <> '')
);
--> statement-breakpoint
CREATE TABLE "note_events" (
	"id" bigint PRIMARY KEY GENERATED ALWAYS AS IDENTITY (sequence name "note_events_id_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"note_id" uuid NOT NULL,
	"actor_id" uuid NOT NULL,
	"what" jsonb NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "note_posts" (
	"id" uuid PRIMARY KEY NOT NULL,
	"note_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"author_id" uuid,
	"guest_name" text,
	"words" text NOT NULL,
	"mentions" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"drawing" jsonb,
	"revision" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"edited_at" timestamp (3) with time zone,
	"deleted_at" timestamp (3) with time zone,
	CONSTRAINT "note_posts_number" UNIQUE("note_id","number"),
	CONSTRAINT "note_posts_number_positive" CHECK ("note_posts"."number" >= 1),
	CONSTRAINT "note_posts_words" CHECK (length("note_posts"."words") <= 4000),
	CONSTRAINT "note_posts_writer" CHECK (("note_posts"."author_id" is null) = ("note_posts"."guest_name" is not null)
        and length("note_posts"."guest_name") between 1 and 80),
	CONSTRAINT "note_posts_emptied" CHECK ("note_posts"."deleted_at" is null or ("note_posts"."words" = '' and "note_posts"."drawing" is null))
);
--> statement-breakpoint
CREATE TABLE "notes" (
	"id" uuid PRIMARY KEY NOT NULL,
	"scene_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"version" integer NOT NULL,
	"kind" "note_kind" NOT NULL,
	"state" "note_state" DEFAULT 'open' NOT NULL,
	"heading" text NOT NULL,
	"author_id" uuid,
	"guest_name" text,
	"link_id" uuid,
	"anchor" jsonb NOT NULL,
	"part_id" text NOT NULL,
	"part" text NOT NULL,
	"posts" integer DEFAULT 1 NOT NULL,
	"last_post_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"settled" jsonb,
	"revision" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "notes_number" UNIQUE("scene_id","number"),
	CONSTRAINT "notes_positive" CHECK ("notes"."number" >= 1 and "notes"."posts" >= 1 and "notes"."revision" >= 1),
	CONSTRAINT "notes_heading" CHECK (length("notes"."heading") <= 120),
	CONSTRAINT "notes_settled" CHECK (("notes"."state" = 'settled') = ("notes"."settled" is not null)),
	CONSTRAINT "notes_writer" CHECK (("notes"."author_id" is null) = ("notes"."guest_name" is not null)
        and ("notes"."guest_name" is null) = ("notes"."link_id" is null)
        and length("notes"."guest_name") between 1 and 80)
);
--> statement-breakpoint
CREATE TABLE "review_requests" (
	"id" uuid PRIMARY KEY NOT NULL,
	"scene_id" uuid NOT NULL,
	"version" integer NOT NULL,
	"asked_by" uuid NOT NULL,
	"due" date NOT NULL,
	"message" text NOT NULL,
	"checklist" jsonb NOT NULL,
	"ended_as" "review_end",
	"ended_at" timestamp (3) with time zone,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "review_requests_end" CHECK (("review_requests"."ended_at" is null) = ("review_requests"."ended_as" is null)),
	CONSTRAINT "review_requests_message" CHECK (length("review_requests"."message") <= 2000),
	CONSTRAINT "review_requests_checklist" CHECK (jsonb_typeof("review_requests"."checklist") = 'array')
);
--> statement-breakpoint
CREATE TABLE "review_reviewers" (
	"request_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	CONSTRAINT "review_reviewers_request_id_user_id_pk" PRIMARY KEY("request_id","user_id")
);
--> statement-breakpoint
CREATE TABLE "verdicts" (
	"id" uuid PRIMARY KEY NOT NULL,
	"scene_id" uuid NOT NULL,
	"version" integer NOT NULL,
	"request_id" uuid,
	"user_id" uuid,
	"link_id" uuid,
	"guest_name" text,
	"word" "verdict_word" NOT NULL,
	"sentence" text NOT NULL,
	"hash" text NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "verdicts_one_giver" CHECK (("verdicts"."user_id" is null) <> ("verdicts"."link_id" is null)),
	CONSTRAINT "verdicts_guest_named" CHECK (("verdicts"."link_id" is null) = ("verdicts"."guest_name" is null)),
	CONSTRAINT "verdicts_guest_name" CHECK (length("verdicts"."guest_name") between 1 and 80),
	CONSTRAINT "verdicts_sentence" CHECK (length("verdicts"."sentence") <= 500),
	CONSTRAINT "verdicts_hash" CHECK ("verdicts"."hash" ~ '^[0-9a-f]{64}$')
);
--> statement-breakpoint
CREATE TABLE "version_openings" (
	"scene_id" uuid NOT NULL,
	"version" integer NOT NULL,
	"user_id" uuid NOT NULL,
	"first_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"last_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "version_openings_scene_id_version_user_id_pk" PRIMARY KEY("scene_id","version","user_id")
);
--> statement-breakpoint
CREATE TABLE "version_states" (
	"scene_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"state" "version_state" NOT NULL,
	"changed_by" uuid,
	"changed_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"reason" text DEFAULT '' NOT NULL,
	CONSTRAINT "version_states_scene_id_number_pk" PRIMARY KEY("scene_id","number"),
	CONSTRAINT "version_states_reason" CHECK (length("version_states"."reason") <= 500)
);
--> statement-breakpoint
ALTER TABLE "checklist_answers" ADD CONSTRAINT "checklist_answers_request_id_review_requests_id_fk" FOREIGN KEY ("request_id") REFERENCES "public"."review_requests"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "checklist_answers" ADD CONSTRAINT "checklist_answers_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "note_events" ADD CONSTRAINT "note_events_note_id_notes_id_fk" FOREIGN KEY ("note_id") REFERENCES "public"."notes"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "note_events" ADD CONSTRAINT "note_events_actor_id_users_id_fk" FOREIGN KEY ("actor_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "note_posts" ADD CONSTRAINT "note_posts_note_id_notes_id_fk" FOREIGN KEY ("note_id") REFERENCES "public"."notes"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "note_posts" ADD CONSTRAINT "note_posts_author_id_users_id_fk" FOREIGN KEY ("author_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notes" ADD CONSTRAINT "notes_scene_id_scenes_id_fk" FOREIGN KEY ("scene_id") REFERENCES "public"."scenes"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notes" ADD CONSTRAINT "notes_author_id_users_id_fk" FOREIGN KEY ("author_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notes" ADD CONSTRAINT "notes_link_id_share_links_id_fk" FOREIGN KEY ("link_id") REFERENCES "public"."share_links"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notes" ADD CONSTRAINT "notes_version" FOREIGN KEY ("scene_id","version") REFERENCES "public"."scene_versions"("scene_id","number") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "review_requests" ADD CONSTRAINT "review_requests_asked_by_users_id_fk" FOREIGN KEY ("asked_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "review_requests" ADD CONSTRAINT "review_requests_version" FOREIGN KEY ("scene_id","version") REFERENCES "public"."scene_versions"("scene_id","number") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "review_reviewers" ADD CONSTRAINT "review_reviewers_request_id_review_requests_id_fk" FOREIGN KEY ("request_id") REFERENCES "public"."review_requests"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "review_reviewers" ADD CONSTRAINT "review_reviewers_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "verdicts" ADD CONSTRAINT "verdicts_request_id_review_requests_id_fk" FOREIGN KEY ("request_id") REFERENCES "public"."review_requests"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "verdicts" ADD CONSTRAINT "verdicts_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "verdicts" ADD CONSTRAINT "verdicts_link_id_share_links_id_fk" FOREIGN KEY ("link_id") REFERENCES "public"."share_links"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "verdicts" ADD CONSTRAINT "verdicts_version" FOREIGN KEY ("scene_id","version") REFERENCES "public"."scene_versions"("scene_id","number") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "version_openings" ADD CONSTRAINT "version_openings_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "version_openings" ADD CONSTRAINT "version_openings_version" FOREIGN KEY ("scene_id","version") REFERENCES "public"."scene_versions"("scene_id","number") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "version_states" ADD CONSTRAINT "version_states_changed_by_users_id_fk" FOREIGN KEY ("changed_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "version_states" ADD CONSTRAINT "version_states_version" FOREIGN KEY ("scene_id","number") REFERENCES "public"."scene_versions"("scene_id","number") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "note_events_note" ON "note_events" USING btree ("note_id","id");--> statement-breakpoint
CREATE INDEX "notes_link" ON "notes" USING btree ("link_id","number");--> statement-breakpoint
CREATE INDEX "notes_open_errors" ON "notes" USING btree ("scene_id","version") WHERE kind = 'error' and state = 'open';--> statement-breakpoint
CREATE INDEX "review_requests_scene" ON "review_requests" USING btree ("scene_id","version","created_at");--> statement-breakpoint
CREATE INDEX "review_requests_asker" ON "review_requests" USING btree ("asked_by","created_at","id");--> statement-breakpoint
CREATE UNIQUE INDEX "review_requests_one_open" ON "review_requests" USING btree ("scene_id","version") WHERE "review_requests"."ended_at" is null;--> statement-breakpoint
CREATE INDEX "review_reviewers_user" ON "review_reviewers" USING btree ("user_id","request_id");--> statement-breakpoint
CREATE INDEX "verdicts_version_time" ON "verdicts" USING btree ("scene_id","version","created_at");--> statement-breakpoint
CREATE INDEX "verdicts_user" ON "verdicts" USING btree ("user_id","created_at","id");--> statement-breakpoint
CREATE INDEX "verdicts_link" ON "verdicts" USING btree ("link_id","version");