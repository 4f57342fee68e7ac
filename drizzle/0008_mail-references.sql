ALTER TABLE "mentions" DROP CONSTRAINT "mentions_once";--> statement-breakpoint
DROP INDEX "mails_of_workshop";--> statement-breakpoint
ALTER TABLE "mentions" ALTER COLUMN "post_id" SET NOT NULL;--> statement-breakpoint
ALTER TABLE "mentions" ADD CONSTRAINT "mentions_note_id_notes_id_fk" FOREIGN KEY ("note_id") REFERENCES "public"."notes"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mentions" ADD CONSTRAINT "mentions_post_id_note_posts_id_fk" FOREIGN KEY ("post_id") REFERENCES "public"."note_posts"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "mails_of_reader" ON "mails" USING btree ("user_id","template","created_at");--> statement-breakpoint
CREATE INDEX "mails_of_workshop" ON "mails" USING btree ("workshop_id","id");--> statement-breakpoint
ALTER TABLE "mentions" ADD CONSTRAINT "mentions_once" UNIQUE("user_id","post_id");