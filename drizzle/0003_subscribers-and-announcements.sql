CREATE TYPE "public"."announcement_state" AS ENUM('draft', 'sending', 'paused', 'sent', 'cancelled');--> statement-breakpoint
CREATE TYPE "public"."message_state" AS ENUM('waiting', 'sending', 'sent', 'failed', 'refused', 'bounced');--> statement-breakpoint
CREATE TYPE "public"."subscriber_state" AS ENUM('asked', 'confirmed', 'left', 'bounced');--> statement-breakpoint
CREATE TABLE "announcements" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"episode_id" uuid NOT NULL,
	"edition_id" uuid NOT NULL,
	"state" "announcement_state" DEFAULT 'draft' NOT NULL,
	"words" text DEFAULT '' NOT NULL,
	"content" jsonb,
	"asked_by" uuid,
	"asked_at" timestamp with time zone,
	"sent_by" uuid,
	"started_at" timestamp with time zone,
	"finished_at" timestamp with time zone,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "announcements_tenant_unique" UNIQUE("workshop_id","id")
);
--> statement-breakpoint
CREATE TABLE "messages" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"announcement_id" uuid NOT NULL,
	"subscriber_id" uuid NOT NULL,
	"message_id" text NOT NULL,
	"state" "message_state" DEFAULT 'waiting' NOT NULL,
	"tries" integer DEFAULT 0 NOT NULL,
	"not_before" timestamp with time zone NOT NULL,
	"claimed_until" timestamp with time zone,
	"sent_at" timestamp with time zone,
	"problem" text,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "messages_subscriber_unique" UNIQUE("announcement_id","subscriber_id"),
	CONSTRAINT "messages_message_id_unique" UNIQUE("message_id")
);
--> statement-breakpoint
CREATE TABLE "subscribers" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"build_id" uuid,
	"email" text NOT NULL,
	"state" "subscriber_state" DEFAULT 'asked' NOT NULL,
	"asked_at" timestamp with time zone NOT NULL,
	"confirmed_at" timestamp with time zone,
	"left_at" timestamp with time zone,
	"bounced_at" timestamp with time zone,
	CONSTRAINT "subscribers_tenant_unique" UNIQUE("workshop_id","id"),
	CONSTRAINT "subscribers_address_unique" UNIQUE NULLS NOT DISTINCT("workshop_id","build_id","email")
);
--> statement-breakpoint
ALTER TABLE "announcements" ADD CONSTRAINT "announcements_asked_by_accounts_id_fk" FOREIGN KEY ("asked_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "announcements" ADD CONSTRAINT "announcements_sent_by_accounts_id_fk" FOREIGN KEY ("sent_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "announcements" ADD CONSTRAINT "announcements_episode_fk" FOREIGN KEY ("workshop_id","episode_id") REFERENCES "public"."episodes"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "announcements" ADD CONSTRAINT "announcements_edition_fk" FOREIGN KEY ("workshop_id","edition_id") REFERENCES "public"."editions"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "messages" ADD CONSTRAINT "messages_announcement_fk" FOREIGN KEY ("workshop_id","announcement_id") REFERENCES "public"."announcements"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "messages" ADD CONSTRAINT "messages_subscriber_fk" FOREIGN KEY ("workshop_id","subscriber_id") REFERENCES "public"."subscribers"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "subscribers" ADD CONSTRAINT "subscribers_workshop_fk" FOREIGN KEY ("workshop_id") REFERENCES "public"."workshops"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "subscribers" ADD CONSTRAINT "subscribers_build_fk" FOREIGN KEY ("workshop_id","build_id") REFERENCES "public"."builds"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "announcements_open_unique" ON "announcements" USING btree ("episode_id") WHERE "announcements"."state" <> 'cancelled';--> statement-breakpoint
CREATE INDEX "announcements_sending_index" ON "announcements" USING btree ("id") WHERE "announcements"."state" = 'sending';--> statement-breakpoint
CREATE INDEX "messages_open_index" ON "messages" USING btree ("announcement_id","not_before") WHERE "messages"."state" in ('waiting', 'sending');--> statement-breakpoint
CREATE INDEX "messages_changed_index" ON "messages" USING btree ("announcement_id","updated_at");--> statement-breakpoint
CREATE INDEX "messages_subscriber_index" ON "messages" USING btree ("subscriber_id");