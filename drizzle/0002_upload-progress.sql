ALTER TABLE "file_variants" ADD COLUMN "frames" integer;--> statement-breakpoint
ALTER TABLE "files" ADD COLUMN "fingerprint" text;--> statement-breakpoint
ALTER TABLE "files" ADD COLUMN "check_tries" smallint DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE "files" ADD COLUMN "progress" smallint;