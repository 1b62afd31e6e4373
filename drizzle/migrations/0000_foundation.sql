CREATE TABLE "account_tokens" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"person_id" uuid,
	"purpose" text NOT NULL,
	"token_hash" text NOT NULL,
	"roles" text[] DEFAULT '{}' NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone,
	"created_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "association" (
	"id" integer PRIMARY KEY DEFAULT 1 NOT NULL,
	"name" text NOT NULL,
	"time_zone" text NOT NULL,
	"locale" text DEFAULT 'en-GB' NOT NULL,
	"contact_email" text NOT NULL,
	"gazetteer" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "association_one_row" CHECK ("association"."id" = 1)
);
--> statement-breakpoint
CREATE TABLE "people" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"password_hash" text,
	"email_confirmed_at" timestamp with time zone,
	"disabled_at" timestamp with time zone,
	"membership_number" text,
	"membership_current" boolean DEFAULT false NOT NULL,
	"created_at" timestamp with time zone NOT NULL,
	CONSTRAINT "people_email_lower" CHECK ("people"."email" = lower("people"."email")),
	CONSTRAINT "people_name_length" CHECK (char_length("people"."name") between 1 and 100)
);
--> statement-breakpoint
CREATE TABLE "person_roles" (
	"person_id" uuid NOT NULL,
	"role" text NOT NULL,
	CONSTRAINT "person_roles_person_id_role_pk" PRIMARY KEY("person_id","role"),
	CONSTRAINT "person_roles_known" CHECK ("person_roles"."role" in ('coordinator', 'organiser', 'administrator'))
);
--> statement-breakpoint
CREATE TABLE "rate_limits" (
	"key" varchar(255) PRIMARY KEY NOT NULL,
	"points" integer DEFAULT 0 NOT NULL,
	"expire" bigint
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"sid" varchar PRIMARY KEY NOT NULL,
	"sess" jsonb NOT NULL,
	"expire" timestamp (6) with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "application_preferences" (
	"application_id" uuid NOT NULL,
	"mentor_person_id" uuid NOT NULL,
	"rank" smallint NOT NULL,
	CONSTRAINT "application_preferences_application_id_rank_pk" PRIMARY KEY("application_id","rank"),
	CONSTRAINT "application_preferences_rank" CHECK ("application_preferences"."rank" between 1 and 3)
);
--> statement-breakpoint
CREATE TABLE "applications" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"cycle_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"side" text NOT NULL,
	"status" text DEFAULT 'draft' NOT NULL,
	"places" smallint DEFAULT 0 NOT NULL,
	"taken" smallint DEFAULT 0 NOT NULL,
	"one_more_if_asked" boolean DEFAULT false NOT NULL,
	"goals" text DEFAULT '' NOT NULL,
	"consent_version" integer,
	"consent_at" timestamp with time zone,
	"late" boolean DEFAULT false NOT NULL,
	"left_out_last_time" boolean DEFAULT false NOT NULL,
	"submitted_at" timestamp with time zone,
	"withdrawn_at" timestamp with time zone,
	"created_at" timestamp with time zone NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "applications_side_known" CHECK ("applications"."side" in ('mentor', 'mentee')),
	CONSTRAINT "applications_status_known" CHECK ("applications"."status" in ('draft', 'submitted', 'admitted', 'waiting-list', 'withdrawn')),
	CONSTRAINT "applications_places_range" CHECK (("applications"."side" = 'mentor' and "applications"."places" between 1 and 6) or ("applications"."side" = 'mentee' and "applications"."places" = 0)),
	CONSTRAINT "applications_places_not_exceeded" CHECK ("applications"."taken" >= 0 and ("applications"."side" = 'mentee' or "applications"."taken" <= "applications"."places"))
);
--> statement-breakpoint
CREATE TABLE "audit_entries" (
	"id" bigint PRIMARY KEY GENERATED ALWAYS AS IDENTITY (sequence name "audit_entries_id_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"at" timestamp with time zone NOT NULL,
	"actor_id" uuid,
	"action" text NOT NULL,
	"subject_id" text NOT NULL,
	"cycle_id" uuid,
	"fields" text[] DEFAULT '{}' NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"request_id" text DEFAULT '' NOT NULL
);
--> statement-breakpoint
CREATE TABLE "cycle_settings_history" (
	"cycle_id" uuid NOT NULL,
	"version" integer NOT NULL,
	"settings" jsonb NOT NULL,
	"saved_by" uuid,
	"saved_at" timestamp with time zone NOT NULL,
	CONSTRAINT "cycle_settings_history_cycle_id_version_pk" PRIMARY KEY("cycle_id","version")
);
--> statement-breakpoint
CREATE TABLE "cycles" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"phase" text DEFAULT 'draft' NOT NULL,
	"applications_open_on" date NOT NULL,
	"applications_close_on" date NOT NULL,
	"answers_due_on" date NOT NULL,
	"starts_on" date NOT NULL,
	"check_in_on" date NOT NULL,
	"ends_on" date NOT NULL,
	"introduction" text DEFAULT '' NOT NULL,
	"consent_text" text NOT NULL,
	"consent_version" integer DEFAULT 1 NOT NULL,
	"ask_first" text DEFAULT 'both' NOT NULL,
	"auto_admit" boolean DEFAULT true NOT NULL,
	"settings" jsonb NOT NULL,
	"settings_version" integer DEFAULT 1 NOT NULL,
	"created_by" uuid,
	"created_at" timestamp with time zone NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "cycles_phase_known" CHECK ("cycles"."phase" in ('draft', 'open', 'applications-closed', 'matching', 'responses', 'under-way', 'closing', 'closed', 'cancelled')),
	CONSTRAINT "cycles_dates_in_order" CHECK ("cycles"."applications_open_on" <= "cycles"."applications_close_on" and "cycles"."applications_close_on" <= "cycles"."answers_due_on" and "cycles"."answers_due_on" <= "cycles"."ends_on" and "cycles"."starts_on" <= "cycles"."check_in_on" and "cycles"."check_in_on" <= "cycles"."ends_on")
);
--> statement-breakpoint
CREATE TABLE "pair_decisions" (
	"cycle_id" uuid NOT NULL,
	"mentee_application_id" uuid NOT NULL,
	"mentor_application_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"overrides_rules" boolean DEFAULT false NOT NULL,
	"decided_by" uuid,
	"decided_at" timestamp with time zone NOT NULL,
	CONSTRAINT "pair_decisions_mentee_application_id_mentor_application_id_pk" PRIMARY KEY("mentee_application_id","mentor_application_id"),
	CONSTRAINT "pair_decisions_kind_known" CHECK ("pair_decisions"."kind" in ('lock', 'bar'))
);
--> statement-breakpoint
CREATE TABLE "plan_pairings" (
	"run_id" uuid NOT NULL,
	"mentee_application_id" uuid NOT NULL,
	"mentor_application_id" uuid NOT NULL,
	"fit" integer NOT NULL,
	"place" integer NOT NULL,
	"scores" integer[] NOT NULL,
	"stays" real,
	"locked" boolean DEFAULT false NOT NULL,
	CONSTRAINT "plan_pairings_run_id_mentee_application_id_pk" PRIMARY KEY("run_id","mentee_application_id")
);
--> statement-breakpoint
CREATE TABLE "rounds" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"cycle_id" uuid NOT NULL,
	"run_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"published_by" uuid,
	"published_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "runs" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"cycle_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"state" text DEFAULT 'queued' NOT NULL,
	"settings" jsonb NOT NULL,
	"input" "bytea",
	"input_hash" text,
	"plan" "bytea",
	"report" jsonb,
	"progress" real DEFAULT 0 NOT NULL,
	"stage" text DEFAULT '' NOT NULL,
	"cancel_requested" boolean DEFAULT false NOT NULL,
	"fault" text,
	"requested_by" uuid,
	"created_at" timestamp with time zone NOT NULL,
	"started_at" timestamp with time zone,
	"heartbeat_at" timestamp with time zone,
	"finished_at" timestamp with time zone,
	CONSTRAINT "runs_state_known" CHECK ("runs"."state" in ('queued', 'running', 'succeeded', 'failed', 'cancelled'))
);
--> statement-breakpoint
CREATE TABLE "mailbox" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"message_id" uuid NOT NULL,
	"sender" text NOT NULL,
	"recipient" text NOT NULL,
	"subject" text NOT NULL,
	"html" text NOT NULL,
	"text" text NOT NULL,
	"headers" jsonb NOT NULL,
	"received_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "messages" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"template" text NOT NULL,
	"cause" text NOT NULL,
	"recipient_id" uuid,
	"address" text NOT NULL,
	"data" jsonb NOT NULL,
	"state" text DEFAULT 'queued' NOT NULL,
	"attempts" integer DEFAULT 0 NOT NULL,
	"due_at" timestamp with time zone NOT NULL,
	"fault" text,
	"created_at" timestamp with time zone NOT NULL,
	"sent_at" timestamp with time zone,
	CONSTRAINT "messages_state_known" CHECK ("messages"."state" in ('queued', 'sent', 'refused', 'dead', 'cancelled'))
);
--> statement-breakpoint
CREATE TABLE "pairings" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"cycle_id" uuid NOT NULL,
	"round_id" uuid NOT NULL,
	"mentee_application_id" uuid NOT NULL,
	"mentor_application_id" uuid NOT NULL,
	"fit" integer NOT NULL,
	"shared" jsonb NOT NULL,
	"state" text DEFAULT 'pending' NOT NULL,
	"mentee_answer" text DEFAULT 'unanswered' NOT NULL,
	"mentee_answered_at" timestamp with time zone,
	"mentee_reason" text DEFAULT '' NOT NULL,
	"mentee_token_hash" text NOT NULL,
	"mentor_answer" text DEFAULT 'unanswered' NOT NULL,
	"mentor_answered_at" timestamp with time zone,
	"mentor_reason" text DEFAULT '' NOT NULL,
	"mentor_token_hash" text NOT NULL,
	"answers_due_at" timestamp with time zone NOT NULL,
	"under_way_at" timestamp with time zone,
	"ended_at" timestamp with time zone,
	"created_at" timestamp with time zone NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "pairings_state_known" CHECK ("pairings"."state" in ('pending', 'under-way', 'declined', 'expired', 'withdrawn', 'completed', 'ended-early')),
	CONSTRAINT "pairings_answers_known" CHECK ("pairings"."mentee_answer" in ('unanswered', 'accepted', 'declined') and "pairings"."mentor_answer" in ('unanswered', 'accepted', 'declined')),
	CONSTRAINT "pairings_pair_means_both_accepted" CHECK ("pairings"."state" not in ('under-way', 'completed', 'ended-early') or ("pairings"."mentee_answer" = 'accepted' and "pairings"."mentor_answer" = 'accepted'))
);
--> statement-breakpoint
CREATE TABLE "declared_interests" (
	"person_id" uuid NOT NULL,
	"other_id" uuid NOT NULL,
	"kind" text NOT NULL,
	CONSTRAINT "declared_interests_person_id_other_id_pk" PRIMARY KEY("person_id","other_id")
);
--> statement-breakpoint
CREATE TABLE "profile_exclusions" (
	"person_id" uuid NOT NULL,
	"other_id" uuid NOT NULL,
	CONSTRAINT "profile_exclusions_person_id_other_id_pk" PRIMARY KEY("person_id","other_id")
);
--> statement-breakpoint
CREATE TABLE "profile_tags" (
	"person_id" uuid NOT NULL,
	"tag_id" uuid NOT NULL,
	"direction" text NOT NULL,
	"priority" smallint NOT NULL,
	CONSTRAINT "profile_tags_person_id_direction_tag_id_pk" PRIMARY KEY("person_id","direction","tag_id"),
	CONSTRAINT "profile_tags_priority" CHECK ("profile_tags"."priority" between 1 and 3),
	CONSTRAINT "profile_tags_direction" CHECK ("profile_tags"."direction" in ('offers', 'seeks'))
);
--> statement-breakpoint
CREATE TABLE "profiles" (
	"person_id" uuid PRIMARY KEY NOT NULL,
	"known_as" text DEFAULT '' NOT NULL,
	"pronouns" text DEFAULT '' NOT NULL,
	"headline" text DEFAULT '' NOT NULL,
	"employer" text DEFAULT '' NOT NULL,
	"region" text,
	"town" text,
	"time_zone" text NOT NULL,
	"languages" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"career_stage" text,
	"years_in_practice" smallint,
	"sector" text,
	"credentials" text DEFAULT '' NOT NULL,
	"meeting_mode" text,
	"max_distance_km" smallint,
	"availability" text[] DEFAULT '{}' NOT NULL,
	"hopes" text DEFAULT '' NOT NULL,
	"style" text DEFAULT '' NOT NULL,
	"cannot_help_with" text DEFAULT '' NOT NULL,
	"wished_years_min" smallint,
	"wished_years_max" smallint,
	"wished_sector" text DEFAULT 'any' NOT NULL,
	"wished_stages" text[] DEFAULT '{}' NOT NULL,
	"listed" boolean DEFAULT false NOT NULL,
	"adjustments" text DEFAULT '' NOT NULL,
	"about_version" integer DEFAULT 1 NOT NULL,
	"practice_version" integer DEFAULT 1 NOT NULL,
	"interests_version" integer DEFAULT 1 NOT NULL,
	"meeting_version" integer DEFAULT 1 NOT NULL,
	"wishes_version" integer DEFAULT 1 NOT NULL,
	"private_version" integer DEFAULT 1 NOT NULL,
	"updated_at" timestamp with time zone NOT NULL,
	CONSTRAINT "profiles_years_range" CHECK ("profiles"."years_in_practice" between 0 and 70),
	CONSTRAINT "profiles_distance_range" CHECK ("profiles"."max_distance_km" between 0 and 1000)
);
--> statement-breakpoint
CREATE TABLE "tags" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"slug" text NOT NULL,
	"kind" text NOT NULL,
	"label" text NOT NULL,
	"synonyms" text[] DEFAULT '{}' NOT NULL,
	"parent_id" uuid,
	"state" text DEFAULT 'approved' NOT NULL,
	"suggested_by" uuid,
	"created_at" timestamp with time zone NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "tags_kind_known" CHECK ("tags"."kind" in ('practice-area', 'topic')),
	CONSTRAINT "tags_state_known" CHECK ("tags"."state" in ('suggested', 'approved', 'retired'))
);
--> statement-breakpoint
ALTER TABLE "account_tokens" ADD CONSTRAINT "account_tokens_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "person_roles" ADD CONSTRAINT "person_roles_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "application_preferences" ADD CONSTRAINT "application_preferences_application_id_applications_id_fk" FOREIGN KEY ("application_id") REFERENCES "public"."applications"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "application_preferences" ADD CONSTRAINT "application_preferences_mentor_person_id_people_id_fk" FOREIGN KEY ("mentor_person_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "applications" ADD CONSTRAINT "applications_cycle_id_cycles_id_fk" FOREIGN KEY ("cycle_id") REFERENCES "public"."cycles"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "applications" ADD CONSTRAINT "applications_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cycle_settings_history" ADD CONSTRAINT "cycle_settings_history_cycle_id_cycles_id_fk" FOREIGN KEY ("cycle_id") REFERENCES "public"."cycles"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cycle_settings_history" ADD CONSTRAINT "cycle_settings_history_saved_by_people_id_fk" FOREIGN KEY ("saved_by") REFERENCES "public"."people"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cycles" ADD CONSTRAINT "cycles_created_by_people_id_fk" FOREIGN KEY ("created_by") REFERENCES "public"."people"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pair_decisions" ADD CONSTRAINT "pair_decisions_cycle_id_cycles_id_fk" FOREIGN KEY ("cycle_id") REFERENCES "public"."cycles"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pair_decisions" ADD CONSTRAINT "pair_decisions_mentee_application_id_applications_id_fk" FOREIGN KEY ("mentee_application_id") REFERENCES "public"."applications"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pair_decisions" ADD CONSTRAINT "pair_decisions_mentor_application_id_applications_id_fk" FOREIGN KEY ("mentor_application_id") REFERENCES "public"."applications"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pair_decisions" ADD CONSTRAINT "pair_decisions_decided_by_people_id_fk" FOREIGN KEY ("decided_by") REFERENCES "public"."people"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plan_pairings" ADD CONSTRAINT "plan_pairings_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plan_pairings" ADD CONSTRAINT "plan_pairings_mentee_application_id_applications_id_fk" FOREIGN KEY ("mentee_application_id") REFERENCES "public"."applications"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plan_pairings" ADD CONSTRAINT "plan_pairings_mentor_application_id_applications_id_fk" FOREIGN KEY ("mentor_application_id") REFERENCES "public"."applications"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "rounds" ADD CONSTRAINT "rounds_cycle_id_cycles_id_fk" FOREIGN KEY ("cycle_id") REFERENCES "public"."cycles"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "rounds" ADD CONSTRAINT "rounds_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "rounds" ADD CONSTRAINT "rounds_published_by_people_id_fk" FOREIGN KEY ("published_by") REFERENCES "public"."people"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "runs" ADD CONSTRAINT "runs_cycle_id_cycles_id_fk" FOREIGN KEY ("cycle_id") REFERENCES "public"."cycles"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "runs" ADD CONSTRAINT "runs_requested_by_people_id_fk" FOREIGN KEY ("requested_by") REFERENCES "public"."people"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mailbox" ADD CONSTRAINT "mailbox_message_id_messages_id_fk" FOREIGN KEY ("message_id") REFERENCES "public"."messages"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "messages" ADD CONSTRAINT "messages_recipient_id_people_id_fk" FOREIGN KEY ("recipient_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairings" ADD CONSTRAINT "pairings_cycle_id_cycles_id_fk" FOREIGN KEY ("cycle_id") REFERENCES "public"."cycles"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairings" ADD CONSTRAINT "pairings_round_id_rounds_id_fk" FOREIGN KEY ("round_id") REFERENCES "public"."rounds"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairings" ADD CONSTRAINT "pairings_mentee_application_id_applications_id_fk" FOREIGN KEY ("mentee_application_id") REFERENCES "public"."applications"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairings" ADD CONSTRAINT "pairings_mentor_application_id_applications_id_fk" FOREIGN KEY ("mentor_application_id") REFERENCES "public"."applications"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "declared_interests" ADD CONSTRAINT "declared_interests_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "declared_interests" ADD CONSTRAINT "declared_interests_other_id_people_id_fk" FOREIGN KEY ("other_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "profile_exclusions" ADD CONSTRAINT "profile_exclusions_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "profile_exclusions" ADD CONSTRAINT "profile_exclusions_other_id_people_id_fk" FOREIGN KEY ("other_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "profile_tags" ADD CONSTRAINT "profile_tags_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "profile_tags" ADD CONSTRAINT "profile_tags_tag_id_tags_id_fk" FOREIGN KEY ("tag_id") REFERENCES "public"."tags"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "profiles" ADD CONSTRAINT "profiles_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "tags" ADD CONSTRAINT "tags_parent_id_tags_id_fk" FOREIGN KEY ("parent_id") REFERENCES "public"."tags"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "tags" ADD CONSTRAINT "tags_suggested_by_people_id_fk" FOREIGN KEY ("suggested_by") REFERENCES "public"."people"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "account_tokens_hash" ON "account_tokens" USING btree ("token_hash");--> statement-breakpoint
CREATE INDEX "account_tokens_person" ON "account_tokens" USING btree ("person_id","purpose");--> statement-breakpoint
CREATE UNIQUE INDEX "people_email" ON "people" USING btree ("email");--> statement-breakpoint
CREATE UNIQUE INDEX "people_membership_number" ON "people" USING btree ("membership_number");--> statement-breakpoint
CREATE INDEX "sessions_expire" ON "sessions" USING btree ("expire");--> statement-breakpoint
CREATE UNIQUE INDEX "application_preferences_once" ON "application_preferences" USING btree ("application_id","mentor_person_id");--> statement-breakpoint
CREATE UNIQUE INDEX "applications_once_per_side" ON "applications" USING btree ("cycle_id","person_id","side");--> statement-breakpoint
CREATE INDEX "applications_person" ON "applications" USING btree ("person_id");--> statement-breakpoint
CREATE INDEX "audit_entries_subject" ON "audit_entries" USING btree ("subject_id","at");--> statement-breakpoint
CREATE INDEX "audit_entries_at" ON "audit_entries" USING btree ("at");--> statement-breakpoint
CREATE UNIQUE INDEX "cycles_name" ON "cycles" USING btree ("name");--> statement-breakpoint
CREATE INDEX "cycles_phase" ON "cycles" USING btree ("phase");--> statement-breakpoint
CREATE UNIQUE INDEX "pair_decisions_one_lock" ON "pair_decisions" USING btree ("mentee_application_id") WHERE "pair_decisions"."kind" = 'lock';--> statement-breakpoint
CREATE INDEX "pair_decisions_cycle" ON "pair_decisions" USING btree ("cycle_id");--> statement-breakpoint
CREATE INDEX "plan_pairings_mentor" ON "plan_pairings" USING btree ("run_id","mentor_application_id");--> statement-breakpoint
CREATE UNIQUE INDEX "rounds_number" ON "rounds" USING btree ("cycle_id","number");--> statement-breakpoint
CREATE UNIQUE INDEX "rounds_run" ON "rounds" USING btree ("run_id");--> statement-breakpoint
CREATE UNIQUE INDEX "runs_number" ON "runs" USING btree ("cycle_id","number");--> statement-breakpoint
CREATE UNIQUE INDEX "runs_one_at_a_time" ON "runs" USING btree ("cycle_id") WHERE "runs"."state" in ('queued', 'running');--> statement-breakpoint
CREATE INDEX "mailbox_received" ON "mailbox" USING btree ("received_at");--> statement-breakpoint
CREATE UNIQUE INDEX "messages_once" ON "messages" USING btree ("cause","address","template");--> statement-breakpoint
CREATE INDEX "messages_due" ON "messages" USING btree ("due_at") WHERE "messages"."state" = 'queued';--> statement-breakpoint
CREATE UNIQUE INDEX "pairings_mentee_token" ON "pairings" USING btree ("mentee_token_hash");--> statement-breakpoint
CREATE UNIQUE INDEX "pairings_mentor_token" ON "pairings" USING btree ("mentor_token_hash");--> statement-breakpoint
CREATE UNIQUE INDEX "pairings_one_for_mentee" ON "pairings" USING btree ("mentee_application_id") WHERE "pairings"."state" in ('pending', 'under-way');--> statement-breakpoint
CREATE UNIQUE INDEX "pairings_never_again" ON "pairings" USING btree ("mentee_application_id","mentor_application_id") WHERE "pairings"."state" not in ('expired', 'withdrawn');--> statement-breakpoint
CREATE INDEX "pairings_mentor" ON "pairings" USING btree ("mentor_application_id");--> statement-breakpoint
CREATE INDEX "pairings_cycle" ON "pairings" USING btree ("cycle_id","state");--> statement-breakpoint
CREATE INDEX "profile_tags_tag" ON "profile_tags" USING btree ("tag_id");--> statement-breakpoint
CREATE UNIQUE INDEX "tags_slug" ON "tags" USING btree ("slug");