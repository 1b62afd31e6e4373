CREATE TABLE "plan_approvals" (
	"run_id" uuid PRIMARY KEY NOT NULL,
	"approved_by" uuid NOT NULL,
	"approved_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
ALTER TABLE "cycles" ADD COLUMN "needs_approval" boolean DEFAULT false NOT NULL;--> statement-breakpoint
ALTER TABLE "plan_approvals" ADD CONSTRAINT "plan_approvals_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plan_approvals" ADD CONSTRAINT "plan_approvals_approved_by_people_id_fk" FOREIGN KEY ("approved_by") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;