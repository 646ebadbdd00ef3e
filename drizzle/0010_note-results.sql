CREATE TABLE "note_results" (
	"workshop_id" uuid NOT NULL,
	"note_id" uuid NOT NULL,
	"worksheet_id" uuid NOT NULL,
	"what" text NOT NULL,
	"said" text NOT NULL,
	CONSTRAINT "note_results_pkey" PRIMARY KEY("note_id")
);
--> statement-breakpoint
ALTER TABLE "note_results" ADD CONSTRAINT "note_results_note_fk" FOREIGN KEY ("workshop_id","note_id") REFERENCES "public"."notes"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "note_results" ADD CONSTRAINT "note_results_worksheet_fk" FOREIGN KEY ("workshop_id","worksheet_id") REFERENCES "public"."worksheets"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "note_results_worksheet_index" ON "note_results" USING btree ("worksheet_id");