CREATE TYPE "public"."device" AS ENUM('phone', 'tablet', 'desktop');--> statement-breakpoint
CREATE TABLE "link_openings" (
	"id" uuid PRIMARY KEY NOT NULL,
	"link_id" uuid NOT NULL,
	"version" integer NOT NULL,
	"device" "device" NOT NULL,
	"opened_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"drawing_seconds" integer DEFAULT 0 NOT NULL,
	"figures_seconds" integer DEFAULT 0 NOT NULL,
	"notes_seconds" integer DEFAULT 0 NOT NULL,
	CONSTRAINT "link_openings_seconds" CHECK (least("link_openings"."drawing_seconds", "link_openings"."figures_seconds", "link_openings"."notes_seconds") >= 0)
);
--> statement-breakpoint
CREATE TABLE "link_questions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"link_id" uuid NOT NULL,
	"version" integer NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"question" text NOT NULL,
	"angle_deg" double precision,
	"view" text,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "link_questions_name" CHECK (length("link_questions"."name") between 1 and 120),
	CONSTRAINT "link_questions_question" CHECK (length("link_questions"."question") between 1 and 2000),
	CONSTRAINT "link_questions_view" CHECK (length("link_questions"."view") <= 120)
);
--> statement-breakpoint
ALTER TABLE "link_openings" ADD CONSTRAINT "link_openings_link_id_share_links_id_fk" FOREIGN KEY ("link_id") REFERENCES "public"."share_links"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "link_questions" ADD CONSTRAINT "link_questions_link_id_share_links_id_fk" FOREIGN KEY ("link_id") REFERENCES "public"."share_links"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "link_openings_link" ON "link_openings" USING btree ("link_id","opened_at","id");--> statement-breakpoint
CREATE INDEX "link_openings_age" ON "link_openings" USING btree ("opened_at");--> statement-breakpoint
CREATE INDEX "link_questions_link" ON "link_questions" USING btree ("link_id","created_at","id");--> statement-breakpoint
CREATE INDEX "link_questions_email" ON "link_questions" USING btree ("email","created_at");