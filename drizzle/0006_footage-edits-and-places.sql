CREATE TYPE "public"."edit_source" AS ENUM('list', 'timeline', 'hand');--> statement-breakpoint
CREATE TYPE "public"."creation_means" AS ENUM('start', 'end');--> statement-breakpoint
CREATE TYPE "public"."off_camera_sign" AS ENUM('timer', 'mark', 'diary', 'suggestion');--> statement-breakpoint
CREATE TYPE "public"."slate_reader" AS ENUM('code', 'hand');--> statement-breakpoint
CREATE TYPE "public"."place_status" AS ENUM('placed', 'snapped', 'lost', 'fixed', 'no-footage');--> statement-breakpoint
CREATE TABLE "edit_clips" (
	"workshop_id" uuid NOT NULL,
	"edit_id" uuid NOT NULL,
	"name" text NOT NULL,
	"clip_id" uuid,
	CONSTRAINT "edit_clips_pkey" PRIMARY KEY("edit_id","name")
);
--> statement-breakpoint
CREATE TABLE "edits" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"episode_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"source" "edit_source" NOT NULL,
	"source_name" text NOT NULL,
	"source_text" text,
	"rate_num" integer NOT NULL,
	"rate_den" integer NOT NULL,
	"frames" bigint NOT NULL,
	"record" jsonb NOT NULL,
	"taken_by" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "edits_tenant_unique" UNIQUE("workshop_id","id"),
	CONSTRAINT "edits_number_unique" UNIQUE("episode_id","number")
);
--> statement-breakpoint
CREATE TABLE "cameras" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"name" text NOT NULL,
	"creation_means" "creation_means" DEFAULT 'start' NOT NULL,
	"local_as_utc" boolean DEFAULT false NOT NULL,
	"time_zone" text,
	"version" integer DEFAULT 1 NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "cameras_tenant_unique" UNIQUE("workshop_id","id")
);
--> statement-breakpoint
CREATE TABLE "clip_parts" (
	"workshop_id" uuid NOT NULL,
	"clip_id" uuid NOT NULL,
	"part_id" uuid NOT NULL,
	CONSTRAINT "clip_parts_pkey" PRIMARY KEY("clip_id","part_id")
);
--> statement-breakpoint
CREATE TABLE "clips" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"build_id" uuid NOT NULL,
	"camera_id" uuid,
	"file_id" uuid,
	"name" text NOT NULL,
	"frames" bigint,
	"rate_num" integer NOT NULL,
	"rate_den" integer NOT NULL,
	"start_label" bigint,
	"drop" boolean DEFAULT false NOT NULL,
	"created_wall" timestamp(3),
	"created_offset" integer,
	"start_set_at" timestamp with time zone,
	"pace_num" integer DEFAULT 1 NOT NULL,
	"pace_den" integer DEFAULT 1 NOT NULL,
	"frame_times" jsonb,
	"stage_id" uuid,
	"added_by" uuid,
	"version" integer DEFAULT 1 NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "clips_tenant_unique" UNIQUE("workshop_id","id"),
	CONSTRAINT "clips_pace_forward" CHECK ("clips"."pace_num" > 0 and "clips"."pace_den" > 0)
);
--> statement-breakpoint
CREATE TABLE "slates" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"clip_id" uuid NOT NULL,
	"frame" bigint NOT NULL,
	"shop_at" timestamp with time zone NOT NULL,
	"read_by" "slate_reader" NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "slates_tenant_unique" UNIQUE("workshop_id","id")
);
--> statement-breakpoint
CREATE TABLE "work_stretches" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"build_id" uuid NOT NULL,
	"from_at" timestamp with time zone NOT NULL,
	"until_at" timestamp with time zone,
	"sign" "off_camera_sign" NOT NULL,
	"stage_id" uuid,
	"text" text DEFAULT '' NOT NULL,
	"added_by" uuid,
	"version" integer DEFAULT 1 NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "work_stretches_tenant_unique" UNIQUE("workshop_id","id"),
	CONSTRAINT "work_stretches_forward" CHECK ("work_stretches"."until_at" is null or "work_stretches"."until_at" > "work_stretches"."from_at")
);
--> statement-breakpoint
CREATE TABLE "places" (
	"workshop_id" uuid NOT NULL,
	"anchor_id" uuid NOT NULL,
	"edit_id" uuid NOT NULL,
	"position" smallint NOT NULL,
	"status" "place_status" NOT NULL,
	"frame" bigint,
	"end_frame" bigint,
	"clip_id" uuid,
	"clip_frame" bigint,
	"by_picture" boolean DEFAULT false NOT NULL,
	"to_edge" boolean DEFAULT false NOT NULL,
	"dropped" text,
	CONSTRAINT "places_pkey" PRIMARY KEY("anchor_id","edit_id","position")
);
--> statement-breakpoint
ALTER TABLE "anchors" DROP CONSTRAINT "anchors_clip_fk";
--> statement-breakpoint
ALTER TABLE "editions" ADD COLUMN "edit_id" uuid;--> statement-breakpoint
ALTER TABLE "anchors" ADD COLUMN "typed_frame" bigint;--> statement-breakpoint
ALTER TABLE "anchors" ADD COLUMN "typed_end_frame" bigint;--> statement-breakpoint
ALTER TABLE "anchors" ADD COLUMN "typed_rate_num" integer;--> statement-breakpoint
ALTER TABLE "anchors" ADD COLUMN "typed_rate_den" integer;--> statement-breakpoint
ALTER TABLE "edit_clips" ADD CONSTRAINT "edit_clips_edit_fk" FOREIGN KEY ("workshop_id","edit_id") REFERENCES "public"."edits"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "edit_clips" ADD CONSTRAINT "edit_clips_clip_fk" FOREIGN KEY ("workshop_id","clip_id") REFERENCES "public"."clips"("workshop_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "edits" ADD CONSTRAINT "edits_taken_by_accounts_id_fk" FOREIGN KEY ("taken_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "edits" ADD CONSTRAINT "edits_episode_fk" FOREIGN KEY ("workshop_id","episode_id") REFERENCES "public"."episodes"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cameras" ADD CONSTRAINT "cameras_workshop_fk" FOREIGN KEY ("workshop_id") REFERENCES "public"."workshops"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "clip_parts" ADD CONSTRAINT "clip_parts_clip_fk" FOREIGN KEY ("workshop_id","clip_id") REFERENCES "public"."clips"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "clip_parts" ADD CONSTRAINT "clip_parts_part_fk" FOREIGN KEY ("workshop_id","part_id") REFERENCES "public"."parts"("workshop_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "clips" ADD CONSTRAINT "clips_added_by_accounts_id_fk" FOREIGN KEY ("added_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "clips" ADD CONSTRAINT "clips_build_fk" FOREIGN KEY ("workshop_id","build_id") REFERENCES "public"."builds"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "clips" ADD CONSTRAINT "clips_camera_fk" FOREIGN KEY ("workshop_id","camera_id") REFERENCES "public"."cameras"("workshop_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "clips" ADD CONSTRAINT "clips_file_fk" FOREIGN KEY ("workshop_id","file_id") REFERENCES "public"."files"("workshop_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "clips" ADD CONSTRAINT "clips_stage_fk" FOREIGN KEY ("workshop_id","stage_id") REFERENCES "public"."stages"("workshop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "slates" ADD CONSTRAINT "slates_clip_fk" FOREIGN KEY ("workshop_id","clip_id") REFERENCES "public"."clips"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "work_stretches" ADD CONSTRAINT "work_stretches_added_by_accounts_id_fk" FOREIGN KEY ("added_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "work_stretches" ADD CONSTRAINT "work_stretches_build_fk" FOREIGN KEY ("workshop_id","build_id") REFERENCES "public"."builds"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "work_stretches" ADD CONSTRAINT "work_stretches_stage_fk" FOREIGN KEY ("workshop_id","stage_id") REFERENCES "public"."stages"("workshop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "places" ADD CONSTRAINT "places_anchor_fk" FOREIGN KEY ("workshop_id","anchor_id") REFERENCES "public"."anchors"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "places" ADD CONSTRAINT "places_edit_fk" FOREIGN KEY ("workshop_id","edit_id") REFERENCES "public"."edits"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "places" ADD CONSTRAINT "places_clip_fk" FOREIGN KEY ("workshop_id","clip_id") REFERENCES "public"."clips"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "edit_clips_clip_index" ON "edit_clips" USING btree ("clip_id");--> statement-breakpoint
CREATE UNIQUE INDEX "cameras_name_unique" ON "cameras" USING btree ("workshop_id",lower("name")) WHERE "cameras"."deleted_at" is null;--> statement-breakpoint
CREATE INDEX "clips_build_index" ON "clips" USING btree ("build_id");--> statement-breakpoint
CREATE UNIQUE INDEX "clips_file_unique" ON "clips" USING btree ("file_id") WHERE "clips"."deleted_at" is null;--> statement-breakpoint
CREATE INDEX "slates_clip_index" ON "slates" USING btree ("clip_id");--> statement-breakpoint
CREATE INDEX "work_stretches_build_index" ON "work_stretches" USING btree ("build_id","from_at");--> statement-breakpoint
CREATE INDEX "places_edit_index" ON "places" USING btree ("edit_id","frame") WHERE "places"."frame" is not null;--> statement-breakpoint
ALTER TABLE "editions" ADD CONSTRAINT "editions_edit_fk" FOREIGN KEY ("workshop_id","edit_id") REFERENCES "public"."edits"("workshop_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "anchors" ADD CONSTRAINT "anchors_clip_fk" FOREIGN KEY ("workshop_id","clip_id") REFERENCES "public"."clips"("workshop_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "anchors_build_index" ON "anchors" USING btree ("build_id");--> statement-breakpoint
ALTER TABLE "anchors" ADD CONSTRAINT "anchors_typed_whole" CHECK (num_nonnulls("anchors"."typed_frame", "anchors"."typed_rate_num", "anchors"."typed_rate_den") in (0, 3));