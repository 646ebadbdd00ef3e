CREATE TYPE "public"."question_source" AS ENUM('account', 'mail', 'pasted');--> statement-breakpoint
CREATE TYPE "public"."question_state" AS ENUM('waiting', 'shown', 'hidden');--> statement-breakpoint
CREATE TABLE "answer_versions" (
	"workshop_id" uuid NOT NULL,
	"answer_id" uuid NOT NULL,
	"version" integer NOT NULL,
	"fields" jsonb NOT NULL,
	"changed_by" uuid,
	"changed_at" timestamp with time zone NOT NULL,
	CONSTRAINT "answer_versions_pkey" PRIMARY KEY("answer_id","version")
);
--> statement-breakpoint
CREATE TABLE "answers" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"question_id" uuid NOT NULL,
	"text" text NOT NULL,
	"answered_at" timestamp with time zone,
	"by_owner" boolean DEFAULT false NOT NULL,
	"written_by" uuid,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "answers_tenant_unique" UNIQUE("workshop_id","id"),
	CONSTRAINT "answers_question_unique" UNIQUE("question_id")
);
--> statement-breakpoint
CREATE TABLE "barred_askers" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"account_id" uuid,
	"email" text,
	"barred_by" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "barred_askers_one_way" CHECK (num_nonnulls("barred_askers"."account_id", "barred_askers"."email") = 1)
);
--> statement-breakpoint
CREATE TABLE "question_parts" (
	"workshop_id" uuid NOT NULL,
	"question_id" uuid NOT NULL,
	"part_id" uuid NOT NULL,
	"position" integer NOT NULL,
	CONSTRAINT "question_parts_pkey" PRIMARY KEY("question_id","part_id")
);
--> statement-breakpoint
CREATE TABLE "questions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workshop_id" uuid NOT NULL,
	"build_id" uuid NOT NULL,
	"anchor_id" uuid,
	"note_id" uuid,
	"text" text NOT NULL,
	"state" "question_state" DEFAULT 'waiting' NOT NULL,
	"source" "question_source" NOT NULL,
	"asker_id" uuid,
	"asker_name" text NOT NULL,
	"asker_email" text,
	"found_at" text,
	"confirmed_at" timestamp with time zone,
	"risky" boolean DEFAULT false NOT NULL,
	"risks" text[] DEFAULT '{}' NOT NULL,
	"urgent_at" timestamp with time zone,
	"assigned_to" uuid,
	"merged_into" uuid,
	"told_at" timestamp with time zone,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "questions_tenant_unique" UNIQUE("workshop_id","id"),
	CONSTRAINT "questions_not_into_itself" CHECK ("questions"."merged_into" <> "questions"."id")
);
--> statement-breakpoint
ALTER TABLE "answer_versions" ADD CONSTRAINT "answer_versions_changed_by_accounts_id_fk" FOREIGN KEY ("changed_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "answer_versions" ADD CONSTRAINT "answer_versions_answer_fk" FOREIGN KEY ("workshop_id","answer_id") REFERENCES "public"."answers"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "answers" ADD CONSTRAINT "answers_written_by_accounts_id_fk" FOREIGN KEY ("written_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "answers" ADD CONSTRAINT "answers_question_fk" FOREIGN KEY ("workshop_id","question_id") REFERENCES "public"."questions"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "barred_askers" ADD CONSTRAINT "barred_askers_workshop_id_workshops_id_fk" FOREIGN KEY ("workshop_id") REFERENCES "public"."workshops"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "barred_askers" ADD CONSTRAINT "barred_askers_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "barred_askers" ADD CONSTRAINT "barred_askers_barred_by_accounts_id_fk" FOREIGN KEY ("barred_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "question_parts" ADD CONSTRAINT "question_parts_question_fk" FOREIGN KEY ("workshop_id","question_id") REFERENCES "public"."questions"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "question_parts" ADD CONSTRAINT "question_parts_part_fk" FOREIGN KEY ("workshop_id","part_id") REFERENCES "public"."parts"("workshop_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "questions" ADD CONSTRAINT "questions_asker_id_accounts_id_fk" FOREIGN KEY ("asker_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "questions" ADD CONSTRAINT "questions_assigned_to_accounts_id_fk" FOREIGN KEY ("assigned_to") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "questions" ADD CONSTRAINT "questions_build_fk" FOREIGN KEY ("workshop_id","build_id") REFERENCES "public"."builds"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "questions" ADD CONSTRAINT "questions_anchor_fk" FOREIGN KEY ("workshop_id","anchor_id") REFERENCES "public"."anchors"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "questions" ADD CONSTRAINT "questions_note_fk" FOREIGN KEY ("workshop_id","note_id") REFERENCES "public"."notes"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "questions" ADD CONSTRAINT "questions_merged_fk" FOREIGN KEY ("workshop_id","merged_into") REFERENCES "public"."questions"("workshop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "barred_askers_account_unique" ON "barred_askers" USING btree ("workshop_id","account_id");--> statement-breakpoint
CREATE UNIQUE INDEX "barred_askers_email_unique" ON "barred_askers" USING btree ("workshop_id","email");--> statement-breakpoint
CREATE INDEX "question_parts_part_index" ON "question_parts" USING btree ("part_id");--> statement-breakpoint
CREATE INDEX "questions_build_index" ON "questions" USING btree ("build_id","state");--> statement-breakpoint
CREATE INDEX "questions_workshop_index" ON "questions" USING btree ("workshop_id","state");--> statement-breakpoint
CREATE INDEX "questions_asker_index" ON "questions" USING btree ("asker_id");--> statement-breakpoint
CREATE INDEX "questions_anchor_index" ON "questions" USING btree ("anchor_id");--> statement-breakpoint
CREATE INDEX "questions_merged_index" ON "questions" USING btree ("merged_into");