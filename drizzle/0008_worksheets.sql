CREATE TYPE "public"."worksheet_visibility" AS ENUM('private', 'public');--> statement-breakpoint
CREATE TABLE "worksheets" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"build_id" uuid NOT NULL,
	"sheet" text NOT NULL,
	"title" text NOT NULL,
	"inputs" jsonb NOT NULL,
	"stage_id" uuid,
	"part_id" uuid,
	"entry_id" uuid,
	"episode_id" uuid,
	"visibility" "worksheet_visibility" DEFAULT 'private' NOT NULL,
	"written_by" uuid,
	"version" integer DEFAULT 1 NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "worksheets_tenant_unique" UNIQUE("workshop_id","id"),
	CONSTRAINT "worksheets_one_owner" CHECK (num_nonnulls("worksheets"."stage_id", "worksheets"."part_id", "worksheets"."entry_id", "worksheets"."episode_id") <= 1)
);
--> statement-breakpoint
ALTER TABLE "worksheets" ADD CONSTRAINT "worksheets_written_by_accounts_id_fk" FOREIGN KEY ("written_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "worksheets" ADD CONSTRAINT "worksheets_build_fk" FOREIGN KEY ("workshop_id","build_id") REFERENCES "public"."builds"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "worksheets" ADD CONSTRAINT "worksheets_stage_fk" FOREIGN KEY ("workshop_id","stage_id") REFERENCES "public"."stages"("workshop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "worksheets" ADD CONSTRAINT "worksheets_part_fk" FOREIGN KEY ("workshop_id","part_id") REFERENCES "public"."parts"("workshop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "worksheets" ADD CONSTRAINT "worksheets_entry_fk" FOREIGN KEY ("workshop_id","entry_id") REFERENCES "public"."diary_entries"("workshop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "worksheets" ADD CONSTRAINT "worksheets_episode_fk" FOREIGN KEY ("workshop_id","episode_id") REFERENCES "public"."episodes"("workshop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "worksheets_build_index" ON "worksheets" USING btree ("build_id");