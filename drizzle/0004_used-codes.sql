CREATE TABLE "used_codes" (
	"account_id" uuid PRIMARY KEY NOT NULL,
	"step" bigint NOT NULL
);
--> statement-breakpoint
ALTER TABLE "used_codes" ADD CONSTRAINT "used_codes_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE cascade ON UPDATE no action;