-- Part numbers sort as people count: 9 before 10, A-2 before A-10.
CREATE COLLATION IF NOT EXISTS part_numbers (provider = icu, locale = 'und-u-kn-true');--> statement-breakpoint
CREATE TYPE "public"."build_visibility" AS ENUM('private', 'public');--> statement-breakpoint
CREATE TYPE "public"."diary_visibility" AS ENUM('private', 'public');--> statement-breakpoint
CREATE TYPE "public"."episode_state" AS ENUM('draft', 'ready', 'scheduled', 'published', 'withdrawn');--> statement-breakpoint
CREATE TYPE "public"."file_kind" AS ENUM('photo', 'video', 'sound', 'document', 'text');--> statement-breakpoint
CREATE TYPE "public"."file_purpose" AS ENUM('footage', 'episode', 'diary', 'plan');--> statement-breakpoint
CREATE TYPE "public"."file_state" AS ENUM('uploading', 'checking', 'ready', 'failed');--> statement-breakpoint
CREATE TYPE "public"."anchor_clock" AS ENUM('shop', 'clip', 'episode');--> statement-breakpoint
CREATE TYPE "public"."anchor_of" AS ENUM('picture', 'sound');--> statement-breakpoint
CREATE TYPE "public"."note_audience" AS ENUM('viewers', 'team', 'person');--> statement-breakpoint
CREATE TYPE "public"."note_kind" AS ENUM('step', 'size', 'setting', 'rating', 'change', 'undecided', 'correction', 'caution', 'ask', 'tip');--> statement-breakpoint
CREATE TYPE "public"."size_standing" AS ENUM('plan', 'as-made', 'as-said');--> statement-breakpoint
CREATE TYPE "public"."part_kind" AS ENUM('made', 'bought', 'salvaged');--> statement-breakpoint
CREATE TABLE "build_slugs" (
	"workshop_id" uuid NOT NULL,
	"slug" text NOT NULL,
	"build_id" uuid NOT NULL,
	"current" boolean NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "build_slugs_pkey" PRIMARY KEY("workshop_id","slug")
);
--> statement-breakpoint
CREATE TABLE "builds" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"name" text NOT NULL,
	"about" text DEFAULT '' NOT NULL,
	"visibility" "build_visibility" DEFAULT 'private' NOT NULL,
	"planned_episodes" integer,
	"currency" text DEFAULT 'GBP' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "builds_tenant_unique" UNIQUE("workshop_id","id")
);
--> statement-breakpoint
CREATE TABLE "stages" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"build_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"name" text NOT NULL,
	"about" text DEFAULT '' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "stages_tenant_unique" UNIQUE("workshop_id","id")
);
--> statement-breakpoint
CREATE TABLE "diary_entries" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"build_id" uuid NOT NULL,
	"stage_id" uuid,
	"day" date NOT NULL,
	"text" text NOT NULL,
	"visibility" "diary_visibility" DEFAULT 'private' NOT NULL,
	"written_by" uuid,
	"version" integer DEFAULT 1 NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "diary_entries_tenant_unique" UNIQUE("workshop_id","id")
);
--> statement-breakpoint
CREATE TABLE "diary_photos" (
	"workshop_id" uuid NOT NULL,
	"entry_id" uuid NOT NULL,
	"file_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"description" text DEFAULT '' NOT NULL,
	CONSTRAINT "diary_photos_pkey" PRIMARY KEY("entry_id","file_id")
);
--> statement-breakpoint
CREATE TABLE "captions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"episode_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"language" text NOT NULL,
	"source_name" text NOT NULL,
	"webvtt" text NOT NULL,
	"cue_count" integer NOT NULL,
	"added_by" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "captions_tenant_unique" UNIQUE("workshop_id","id"),
	CONSTRAINT "captions_number_unique" UNIQUE("episode_id","number")
);
--> statement-breakpoint
CREATE TABLE "editions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"episode_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"video_id" uuid NOT NULL,
	"captions_id" uuid,
	"published_at" timestamp with time zone NOT NULL,
	"published_by" uuid,
	"replaced_at" timestamp with time zone,
	"withdrawn_at" timestamp with time zone,
	"back_catalogue" boolean DEFAULT false NOT NULL,
	CONSTRAINT "editions_tenant_unique" UNIQUE("workshop_id","id"),
	CONSTRAINT "editions_number_unique" UNIQUE("episode_id","number")
);
--> statement-breakpoint
CREATE TABLE "episode_numbers" (
	"workshop_id" uuid NOT NULL,
	"build_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"episode_id" uuid NOT NULL,
	"current" boolean NOT NULL,
	CONSTRAINT "episode_numbers_pkey" PRIMARY KEY("build_id","number")
);
--> statement-breakpoint
CREATE TABLE "episodes" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"build_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"title" text NOT NULL,
	"about" text DEFAULT '' NOT NULL,
	"state" "episode_state" DEFAULT 'draft' NOT NULL,
	"published_on" date,
	"ready_asked_by" uuid,
	"ready_asked_at" timestamp with time zone,
	"version" integer DEFAULT 1 NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "episodes_tenant_unique" UNIQUE("workshop_id","id")
);
--> statement-breakpoint
CREATE TABLE "videos" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"episode_id" uuid NOT NULL,
	"file_id" uuid,
	"address" text,
	"duration_frames" bigint,
	"rate_num" integer NOT NULL,
	"rate_den" integer NOT NULL,
	"added_by" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "videos_tenant_unique" UNIQUE("workshop_id","id"),
	CONSTRAINT "videos_one_source" CHECK (num_nonnulls("videos"."file_id", "videos"."address") = 1)
);
--> statement-breakpoint
CREATE TABLE "file_variants" (
	"workshop_id" uuid NOT NULL,
	"file_id" uuid NOT NULL,
	"variant" text NOT NULL,
	"content_type" text NOT NULL,
	"bytes" bigint NOT NULL,
	"width" integer,
	"height" integer,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "file_variants_pkey" PRIMARY KEY("file_id","variant")
);
--> statement-breakpoint
CREATE TABLE "files" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"build_id" uuid NOT NULL,
	"purpose" "file_purpose" NOT NULL,
	"name" text NOT NULL,
	"bytes" bigint NOT NULL,
	"state" "file_state" DEFAULT 'uploading' NOT NULL,
	"failure" text,
	"upload_id" text,
	"kind" "file_kind",
	"content_type" text,
	"width" integer,
	"height" integer,
	"duration_frames" bigint,
	"rate_num" integer,
	"rate_den" integer,
	"probe" jsonb,
	"original_kept" boolean DEFAULT true NOT NULL,
	"added_by" uuid,
	"version" integer DEFAULT 1 NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "files_tenant_unique" UNIQUE("workshop_id","id")
);
--> statement-breakpoint
CREATE TABLE "anchors" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"build_id" uuid NOT NULL,
	"clock" "anchor_clock" NOT NULL,
	"of" "anchor_of" DEFAULT 'picture' NOT NULL,
	"shop_at" timestamp with time zone,
	"shop_until" timestamp with time zone,
	"clip_id" uuid,
	"episode_id" uuid,
	"frame" bigint,
	"end_frame" bigint,
	"rate_num" integer,
	"rate_den" integer,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "anchors_tenant_unique" UNIQUE("workshop_id","id"),
	CONSTRAINT "anchors_one_clock" CHECK (case "anchors"."clock"
        when 'shop' then "anchors"."shop_at" is not null and "anchors"."frame" is null
        when 'clip' then "anchors"."clip_id" is not null and num_nonnulls("anchors"."frame", "anchors"."rate_num", "anchors"."rate_den") = 3
        else "anchors"."episode_id" is not null and num_nonnulls("anchors"."frame", "anchors"."rate_num", "anchors"."rate_den") = 3
      end),
	CONSTRAINT "anchors_end_after_start" CHECK ("anchors"."end_frame" is null or "anchors"."end_frame" > "anchors"."frame")
);
--> statement-breakpoint
CREATE TABLE "appearances" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"anchor_id" uuid NOT NULL,
	"part_id" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "appearances_tenant_unique" UNIQUE("workshop_id","id")
);
--> statement-breakpoint
CREATE TABLE "chapters" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"episode_id" uuid NOT NULL,
	"anchor_id" uuid NOT NULL,
	"title" text NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "chapters_tenant_unique" UNIQUE("workshop_id","id")
);
--> statement-breakpoint
CREATE TABLE "note_parts" (
	"workshop_id" uuid NOT NULL,
	"note_id" uuid NOT NULL,
	"part_id" uuid NOT NULL,
	"position" integer NOT NULL,
	CONSTRAINT "note_parts_pkey" PRIMARY KEY("note_id","part_id")
);
--> statement-breakpoint
CREATE TABLE "note_versions" (
	"workshop_id" uuid NOT NULL,
	"note_id" uuid NOT NULL,
	"version" integer NOT NULL,
	"fields" jsonb NOT NULL,
	"changed_by" uuid,
	"changed_at" timestamp with time zone NOT NULL,
	CONSTRAINT "note_versions_pkey" PRIMARY KEY("note_id","version")
);
--> statement-breakpoint
CREATE TABLE "notes" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"build_id" uuid NOT NULL,
	"anchor_id" uuid NOT NULL,
	"kind" "note_kind" NOT NULL,
	"text" text NOT NULL,
	"audience" "note_audience" DEFAULT 'team' NOT NULL,
	"asked_id" uuid,
	"answer" text,
	"answered_at" timestamp with time zone,
	"standing" "size_standing",
	"topic" text,
	"proposed" boolean DEFAULT false NOT NULL,
	"written_by" uuid,
	"version" integer DEFAULT 1 NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "notes_tenant_unique" UNIQUE("workshop_id","id")
);
--> statement-breakpoint
CREATE TABLE "part_versions" (
	"part_id" uuid NOT NULL,
	"workshop_id" uuid NOT NULL,
	"version" integer NOT NULL,
	"fields" jsonb NOT NULL,
	"changed_by" uuid,
	"changed_at" timestamp with time zone NOT NULL,
	CONSTRAINT "part_versions_pkey" PRIMARY KEY("part_id","version")
);
--> statement-breakpoint
CREATE TABLE "parts" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"build_id" uuid NOT NULL,
	"number" text NOT NULL,
	"number_key" text NOT NULL,
	"name" text NOT NULL,
	"kind" "part_kind" DEFAULT 'made' NOT NULL,
	"quantity" integer DEFAULT 1 NOT NULL,
	"material" text DEFAULT '' NOT NULL,
	"size" text DEFAULT '' NOT NULL,
	"aliases" text[] DEFAULT '{}' NOT NULL,
	"in_plans" boolean DEFAULT true NOT NULL,
	"remark" text DEFAULT '' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "parts_tenant_unique" UNIQUE("workshop_id","id")
);
--> statement-breakpoint
ALTER TABLE "build_slugs" ADD CONSTRAINT "build_slugs_build_fk" FOREIGN KEY ("workshop_id","build_id") REFERENCES "public"."builds"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "builds" ADD CONSTRAINT "builds_workshop_fk" FOREIGN KEY ("workshop_id") REFERENCES "public"."workshops"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stages" ADD CONSTRAINT "stages_build_fk" FOREIGN KEY ("workshop_id","build_id") REFERENCES "public"."builds"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "diary_entries" ADD CONSTRAINT "diary_entries_written_by_accounts_id_fk" FOREIGN KEY ("written_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "diary_entries" ADD CONSTRAINT "diary_entries_build_fk" FOREIGN KEY ("workshop_id","build_id") REFERENCES "public"."builds"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "diary_entries" ADD CONSTRAINT "diary_entries_stage_fk" FOREIGN KEY ("workshop_id","stage_id") REFERENCES "public"."stages"("workshop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "diary_photos" ADD CONSTRAINT "diary_photos_entry_fk" FOREIGN KEY ("workshop_id","entry_id") REFERENCES "public"."diary_entries"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "diary_photos" ADD CONSTRAINT "diary_photos_file_fk" FOREIGN KEY ("workshop_id","file_id") REFERENCES "public"."files"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "captions" ADD CONSTRAINT "captions_added_by_accounts_id_fk" FOREIGN KEY ("added_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "captions" ADD CONSTRAINT "captions_episode_fk" FOREIGN KEY ("workshop_id","episode_id") REFERENCES "public"."episodes"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "editions" ADD CONSTRAINT "editions_published_by_accounts_id_fk" FOREIGN KEY ("published_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "editions" ADD CONSTRAINT "editions_episode_fk" FOREIGN KEY ("workshop_id","episode_id") REFERENCES "public"."episodes"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "editions" ADD CONSTRAINT "editions_video_fk" FOREIGN KEY ("workshop_id","video_id") REFERENCES "public"."videos"("workshop_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "editions" ADD CONSTRAINT "editions_captions_fk" FOREIGN KEY ("workshop_id","captions_id") REFERENCES "public"."captions"("workshop_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "episode_numbers" ADD CONSTRAINT "episode_numbers_episode_fk" FOREIGN KEY ("workshop_id","episode_id") REFERENCES "public"."episodes"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "episodes" ADD CONSTRAINT "episodes_ready_asked_by_accounts_id_fk" FOREIGN KEY ("ready_asked_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "episodes" ADD CONSTRAINT "episodes_build_fk" FOREIGN KEY ("workshop_id","build_id") REFERENCES "public"."builds"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "videos" ADD CONSTRAINT "videos_added_by_accounts_id_fk" FOREIGN KEY ("added_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "videos" ADD CONSTRAINT "videos_episode_fk" FOREIGN KEY ("workshop_id","episode_id") REFERENCES "public"."episodes"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "videos" ADD CONSTRAINT "videos_file_fk" FOREIGN KEY ("workshop_id","file_id") REFERENCES "public"."files"("workshop_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "file_variants" ADD CONSTRAINT "file_variants_file_fk" FOREIGN KEY ("workshop_id","file_id") REFERENCES "public"."files"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "files" ADD CONSTRAINT "files_added_by_accounts_id_fk" FOREIGN KEY ("added_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "files" ADD CONSTRAINT "files_build_fk" FOREIGN KEY ("workshop_id","build_id") REFERENCES "public"."builds"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "anchors" ADD CONSTRAINT "anchors_build_fk" FOREIGN KEY ("workshop_id","build_id") REFERENCES "public"."builds"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "anchors" ADD CONSTRAINT "anchors_clip_fk" FOREIGN KEY ("workshop_id","clip_id") REFERENCES "public"."files"("workshop_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "anchors" ADD CONSTRAINT "anchors_episode_fk" FOREIGN KEY ("workshop_id","episode_id") REFERENCES "public"."episodes"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "appearances" ADD CONSTRAINT "appearances_anchor_fk" FOREIGN KEY ("workshop_id","anchor_id") REFERENCES "public"."anchors"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "appearances" ADD CONSTRAINT "appearances_part_fk" FOREIGN KEY ("workshop_id","part_id") REFERENCES "public"."parts"("workshop_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "chapters" ADD CONSTRAINT "chapters_episode_fk" FOREIGN KEY ("workshop_id","episode_id") REFERENCES "public"."episodes"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "chapters" ADD CONSTRAINT "chapters_anchor_fk" FOREIGN KEY ("workshop_id","anchor_id") REFERENCES "public"."anchors"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "note_parts" ADD CONSTRAINT "note_parts_note_fk" FOREIGN KEY ("workshop_id","note_id") REFERENCES "public"."notes"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "note_parts" ADD CONSTRAINT "note_parts_part_fk" FOREIGN KEY ("workshop_id","part_id") REFERENCES "public"."parts"("workshop_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "note_versions" ADD CONSTRAINT "note_versions_changed_by_accounts_id_fk" FOREIGN KEY ("changed_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "note_versions" ADD CONSTRAINT "note_versions_note_fk" FOREIGN KEY ("workshop_id","note_id") REFERENCES "public"."notes"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notes" ADD CONSTRAINT "notes_asked_id_accounts_id_fk" FOREIGN KEY ("asked_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notes" ADD CONSTRAINT "notes_written_by_accounts_id_fk" FOREIGN KEY ("written_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notes" ADD CONSTRAINT "notes_build_fk" FOREIGN KEY ("workshop_id","build_id") REFERENCES "public"."builds"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notes" ADD CONSTRAINT "notes_anchor_fk" FOREIGN KEY ("workshop_id","anchor_id") REFERENCES "public"."anchors"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "part_versions" ADD CONSTRAINT "part_versions_changed_by_accounts_id_fk" FOREIGN KEY ("changed_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "part_versions" ADD CONSTRAINT "part_versions_part_fk" FOREIGN KEY ("workshop_id","part_id") REFERENCES "public"."parts"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "parts" ADD CONSTRAINT "parts_build_fk" FOREIGN KEY ("workshop_id","build_id") REFERENCES "public"."builds"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "build_slugs_current_unique" ON "build_slugs" USING btree ("build_id") WHERE "build_slugs"."current";--> statement-breakpoint
CREATE INDEX "stages_build_index" ON "stages" USING btree ("build_id");--> statement-breakpoint
CREATE INDEX "diary_entries_build_index" ON "diary_entries" USING btree ("build_id","day");--> statement-breakpoint
CREATE UNIQUE INDEX "editions_shown_unique" ON "editions" USING btree ("episode_id") WHERE "editions"."replaced_at" is null and "editions"."withdrawn_at" is null;--> statement-breakpoint
CREATE UNIQUE INDEX "episode_numbers_current_unique" ON "episode_numbers" USING btree ("episode_id") WHERE "episode_numbers"."current";--> statement-breakpoint
CREATE INDEX "episodes_build_index" ON "episodes" USING btree ("build_id");--> statement-breakpoint
CREATE INDEX "videos_episode_index" ON "videos" USING btree ("episode_id");--> statement-breakpoint
CREATE INDEX "files_build_index" ON "files" USING btree ("build_id");--> statement-breakpoint
CREATE INDEX "anchors_episode_index" ON "anchors" USING btree ("episode_id");--> statement-breakpoint
CREATE INDEX "anchors_clip_index" ON "anchors" USING btree ("clip_id");--> statement-breakpoint
CREATE INDEX "appearances_anchor_index" ON "appearances" USING btree ("anchor_id");--> statement-breakpoint
CREATE INDEX "chapters_episode_index" ON "chapters" USING btree ("episode_id");--> statement-breakpoint
CREATE INDEX "note_parts_part_index" ON "note_parts" USING btree ("part_id");--> statement-breakpoint
CREATE INDEX "notes_anchor_index" ON "notes" USING btree ("anchor_id");--> statement-breakpoint
CREATE INDEX "notes_asked_index" ON "notes" USING btree ("asked_id") WHERE "notes"."answered_at" is null and "notes"."deleted_at" is null;--> statement-breakpoint
CREATE UNIQUE INDEX "parts_number_unique" ON "parts" USING btree ("build_id","number_key") WHERE "parts"."deleted_at" is null;--> statement-breakpoint
CREATE INDEX "parts_build_index" ON "parts" USING btree ("build_id");