ALTER TABLE "anchors" DROP CONSTRAINT "anchors_end_after_start";--> statement-breakpoint
ALTER TABLE "edits" ADD COLUMN "places_version" integer DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE "anchors" ADD COLUMN "end_clip_id" uuid;--> statement-breakpoint
ALTER TABLE "anchors" ADD CONSTRAINT "anchors_end_clip_fk" FOREIGN KEY ("workshop_id","end_clip_id") REFERENCES "public"."clips"("workshop_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "anchors" ADD CONSTRAINT "anchors_end_after_start" CHECK ("anchors"."end_frame" is null or "anchors"."end_frame" > "anchors"."frame" or "anchors"."end_clip_id" is not null);