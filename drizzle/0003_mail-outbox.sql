CREATE TYPE "public"."mail_kind" AS ENUM('mentions', 'review-asked', 'review-answered', 'reminders', 'questions');--> statement-breakpoint
CREATE TYPE "public"."mail_state" AS ENUM('waiting', 'sending', 'sent', 'failed', 'unsure', 'held');--> statement-breakpoint
CREATE TYPE "public"."link_kind" AS ENUM('look', 'note', 'decide');--> statement-breakpoint
CREATE TABLE "mail_preferences" (
	"user_id" uuid NOT NULL,
	"kind" "mail_kind" NOT NULL,
	"wanted" boolean NOT NULL,
	"updated_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "mail_preferences_user_id_kind_pk" PRIMARY KEY("user_id","kind")
);
--> statement-breakpoint
CREATE TABLE "unsubscribe_tokens" (
	"token_hash" text PRIMARY KEY NOT NULL,
	"user_id" uuid NOT NULL,
	"kind" "mail_kind" NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "unsubscribe_tokens_hash" CHECK ("unsubscribe_tokens"."token_hash" ~ '^[0-9a-f]{64}$')
);
--> statement-breakpoint
CREATE TABLE "mails" (
	"id" uuid PRIMARY KEY NOT NULL,
	"key" text NOT NULL,
	"template" text NOT NULL,
	"to_email" text NOT NULL,
	"to_name" text NOT NULL,
	"user_id" uuid,
	"workshop_id" uuid,
	"message_id" text NOT NULL,
	"data" jsonb,
	"unsubscribe_token" text,
	"state" "mail_state" DEFAULT 'waiting' NOT NULL,
	"attempts" integer DEFAULT 0 NOT NULL,
	"last_error" text,
	"claim" uuid,
	"claimed_at" timestamp (3) with time zone,
	"sent_at" timestamp (3) with time zone,
	"ends_at" timestamp (3) with time zone,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "mails_key_unique" UNIQUE("key"),
	CONSTRAINT "mails_message_id_unique" UNIQUE("message_id"),
	CONSTRAINT "mails_claimed" CHECK (("mails"."state" <> 'sending') or ("mails"."claim" is not null)),
	CONSTRAINT "mails_sent_empty" CHECK (("mails"."state" <> 'sent') or ("mails"."data" is null)),
	CONSTRAINT "mails_last_error" CHECK (length("mails"."last_error") <= 500)
);
--> statement-breakpoint
CREATE TABLE "mentions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"user_id" uuid NOT NULL,
	"scene_id" uuid NOT NULL,
	"note_id" uuid NOT NULL,
	"post_id" uuid,
	"told_at" timestamp (3) with time zone,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "mentions_once" UNIQUE NULLS NOT DISTINCT("user_id","note_id","post_id")
);
--> statement-breakpoint
ALTER TABLE "share_links" ADD COLUMN "kind" "link_kind" DEFAULT 'look' NOT NULL;--> statement-breakpoint
ALTER TABLE "share_links" ADD COLUMN "password_hash" text;--> statement-breakpoint
ALTER TABLE "share_links" ADD COLUMN "frame_origins" text[] DEFAULT '{}'::text[] NOT NULL;--> statement-breakpoint
ALTER TABLE "mail_preferences" ADD CONSTRAINT "mail_preferences_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "unsubscribe_tokens" ADD CONSTRAINT "unsubscribe_tokens_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mails" ADD CONSTRAINT "mails_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mails" ADD CONSTRAINT "mails_workshop_id_workshops_id_fk" FOREIGN KEY ("workshop_id") REFERENCES "public"."workshops"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mentions" ADD CONSTRAINT "mentions_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mentions" ADD CONSTRAINT "mentions_scene_id_scenes_id_fk" FOREIGN KEY ("scene_id") REFERENCES "public"."scenes"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "unsubscribe_tokens_user" ON "unsubscribe_tokens" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "unsubscribe_tokens_age" ON "unsubscribe_tokens" USING btree ("created_at");--> statement-breakpoint
CREATE INDEX "mails_of_workshop" ON "mails" USING btree ("workshop_id","created_at","id");--> statement-breakpoint
CREATE INDEX "mails_open" ON "mails" USING btree ("created_at") WHERE "mails"."data" is not null;--> statement-breakpoint
CREATE INDEX "mentions_untold" ON "mentions" USING btree ("user_id","created_at") WHERE "mentions"."told_at" is null;--> statement-breakpoint
ALTER TABLE "share_links" ADD CONSTRAINT "share_links_frames" CHECK (cardinality("share_links"."frame_origins") <= 20);