CREATE TABLE "clip_thumbnails" (
	"workshop_id" uuid NOT NULL,
	"clip_id" uuid NOT NULL,
	"jpeg" "bytea" NOT NULL,
	CONSTRAINT "clip_thumbnails_pkey" PRIMARY KEY("clip_id")
);
--> statement-breakpoint
ALTER TABLE "clips" ADD COLUMN "continues_id" uuid;--> statement-breakpoint
ALTER TABLE "clip_thumbnails" ADD CONSTRAINT "clip_thumbnails_clip_fk" FOREIGN KEY ("workshop_id","clip_id") REFERENCES "public"."clips"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "clips" ADD CONSTRAINT "clips_continues_fk" FOREIGN KEY ("workshop_id","continues_id") REFERENCES "public"."clips"("workshop_id","id") ON DELETE no action ON UPDATE no action;