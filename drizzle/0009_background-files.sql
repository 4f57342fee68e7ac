CREATE TYPE "public"."export_state" AS ENUM('waiting', 'made', 'failed');--> statement-breakpoint
CREATE TYPE "public"."theme" AS ENUM('light', 'dark');--> statement-breakpoint
CREATE TABLE "exports" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"wanted" jsonb NOT NULL,
	"state" "export_state" DEFAULT 'waiting' NOT NULL,
	"reason" text,
	"media" text,
	"file_name" text,
	"file" "bytea",
	"ends_at" timestamp (3) with time zone NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "exports_made" CHECK (("exports"."state" = 'made') = ("exports"."file" is not null))
);
--> statement-breakpoint
CREATE TABLE "pictures" (
	"scene_id" uuid NOT NULL,
	"version" integer NOT NULL,
	"theme" "theme" NOT NULL,
	"png" "bytea" NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "pictures_scene_id_version_theme_pk" PRIMARY KEY("scene_id","version","theme")
);
--> statement-breakpoint
CREATE TABLE "rate_buckets" (
	"name" text PRIMARY KEY NOT NULL,
	"tokens" double precision NOT NULL,
	"taken" boolean NOT NULL,
	"at" timestamp (3) with time zone NOT NULL
);
--> statement-breakpoint
ALTER TABLE "exports" ADD CONSTRAINT "exports_workshop_id_workshops_id_fk" FOREIGN KEY ("workshop_id") REFERENCES "public"."workshops"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "exports" ADD CONSTRAINT "exports_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pictures" ADD CONSTRAINT "pictures_version" FOREIGN KEY ("scene_id","version") REFERENCES "public"."scene_versions"("scene_id","number") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "exports_user" ON "exports" USING btree ("user_id","created_at");--> statement-breakpoint
CREATE INDEX "exports_end" ON "exports" USING btree ("ends_at");--> statement-breakpoint
CREATE INDEX "rate_buckets_age" ON "rate_buckets" USING btree ("at");