CREATE TABLE "case_row" (
	"organisation_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"lift_id" uuid NOT NULL,
	"circuit_id" uuid NOT NULL,
	"circuit_revision" integer NOT NULL,
	"status" text NOT NULL,
	"complaint" text NOT NULL,
	"device" text,
	"cause" text,
	"outcome" text,
	"practice" boolean NOT NULL,
	"opened_at" timestamp with time zone NOT NULL,
	"closed_at" timestamp with time zone,
	"opened_by" uuid NOT NULL,
	"readings" integer NOT NULL,
	"dangers" integer NOT NULL,
	"weaknesses" jsonb NOT NULL,
	"risk" double precision NOT NULL,
	"version" integer NOT NULL,
	CONSTRAINT "case_row_organisation_id_id_pk" PRIMARY KEY("organisation_id","id")
);
--> statement-breakpoint
ALTER TABLE "case_row" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "circuit" (
	"organisation_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"name" text NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "circuit_organisation_id_id_pk" PRIMARY KEY("organisation_id","id")
);
--> statement-breakpoint
ALTER TABLE "circuit" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "circuit_revision" (
	"organisation_id" uuid NOT NULL,
	"circuit_id" uuid NOT NULL,
	"revision" integer NOT NULL,
	"issued_at" timestamp with time zone NOT NULL,
	"circuit" jsonb NOT NULL,
	CONSTRAINT "circuit_revision_organisation_id_circuit_id_revision_pk" PRIMARY KEY("organisation_id","circuit_id","revision")
);
--> statement-breakpoint
ALTER TABLE "circuit_revision" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "case_event" (
	"organisation_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"case_id" uuid NOT NULL,
	"device" uuid NOT NULL,
	"sequence" bigint NOT NULL,
	"schema" integer NOT NULL,
	"type" text NOT NULL,
	"payload" jsonb NOT NULL,
	"recorded_at" text NOT NULL,
	"state" jsonb NOT NULL,
	"actor" uuid NOT NULL,
	"received_at" timestamp with time zone NOT NULL,
	"clock_offset_seconds" double precision NOT NULL,
	"case_version" integer NOT NULL,
	"position" bigint NOT NULL,
	"sent_digest" "bytea" NOT NULL,
	CONSTRAINT "case_event_organisation_id_id_pk" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "case_event_position" UNIQUE("organisation_id","position"),
	CONSTRAINT "case_event_case_version" UNIQUE("organisation_id","case_id","case_version"),
	CONSTRAINT "case_event_device_sequence" UNIQUE("organisation_id","device","sequence")
);
--> statement-breakpoint
ALTER TABLE "case_event" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "counter" (
	"organisation_id" uuid NOT NULL,
	"position" bigint DEFAULT 0 NOT NULL,
	CONSTRAINT "counter_organisation_id_pk" PRIMARY KEY("organisation_id")
);
--> statement-breakpoint
ALTER TABLE "counter" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "quarantine" (
	"organisation_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"event_id" text,
	"device" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"code" text NOT NULL,
	"details" jsonb NOT NULL,
	"event" jsonb NOT NULL,
	"sent_digest" "bytea" NOT NULL,
	"received_at" timestamp with time zone NOT NULL,
	CONSTRAINT "quarantine_organisation_id_id_pk" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "quarantine_content" UNIQUE("organisation_id","device","sent_digest")
);
--> statement-breakpoint
ALTER TABLE "quarantine" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "audit" (
	"organisation_id" uuid NOT NULL,
	"position" bigint NOT NULL,
	"at" timestamp with time zone NOT NULL,
	"actor" uuid NOT NULL,
	"action" text NOT NULL,
	"subject" text NOT NULL,
	"outcome" text NOT NULL,
	"previous_hash" "bytea" NOT NULL,
	"hash" "bytea" NOT NULL,
	CONSTRAINT "audit_organisation_id_position_pk" PRIMARY KEY("organisation_id","position")
);
--> statement-breakpoint
ALTER TABLE "audit" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "audit_head" (
	"organisation_id" uuid NOT NULL,
	"position" bigint DEFAULT 0 NOT NULL,
	"hash" "bytea" NOT NULL,
	CONSTRAINT "audit_head_organisation_id_pk" PRIMARY KEY("organisation_id")
);
--> statement-breakpoint
ALTER TABLE "audit_head" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "idempotency" (
	"organisation_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"key" text NOT NULL,
	"request_digest" "bytea" NOT NULL,
	"answer" jsonb,
	"created_at" timestamp with time zone NOT NULL,
	CONSTRAINT "idempotency_organisation_id_person_id_key_pk" PRIMARY KEY("organisation_id","person_id","key")
);
--> statement-breakpoint
ALTER TABLE "idempotency" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "lift" (
	"organisation_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"site_id" uuid NOT NULL,
	"name" text NOT NULL,
	"label" text NOT NULL,
	"maker" text NOT NULL,
	"controller" text NOT NULL,
	"landings" jsonb NOT NULL,
	"hazards" jsonb NOT NULL,
	"notes" text DEFAULT '' NOT NULL,
	"circuit_id" uuid,
	"circuit_revision" integer,
	"practice_faults" jsonb,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "lift_organisation_id_id_pk" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "lift_label" UNIQUE("organisation_id","label")
);
--> statement-breakpoint
ALTER TABLE "lift" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "organisation" (
	"organisation_id" uuid NOT NULL,
	"name" text NOT NULL,
	"time_zone" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "organisation_organisation_id_pk" PRIMARY KEY("organisation_id")
);
--> statement-breakpoint
ALTER TABLE "organisation" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "person" (
	"organisation_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"role" text NOT NULL,
	"disabled" boolean DEFAULT false NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "person_organisation_id_id_pk" PRIMARY KEY("organisation_id","id")
);
--> statement-breakpoint
ALTER TABLE "person" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "person_details" (
	"organisation_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"password_hash" text NOT NULL,
	CONSTRAINT "person_details_organisation_id_person_id_pk" PRIMARY KEY("organisation_id","person_id")
);
--> statement-breakpoint
ALTER TABLE "person_details" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "refresh_token" (
	"organisation_id" uuid NOT NULL,
	"digest" "bytea" NOT NULL,
	"session_id" uuid NOT NULL,
	"issued_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone,
	CONSTRAINT "refresh_token_organisation_id_digest_pk" PRIMARY KEY("organisation_id","digest")
);
--> statement-breakpoint
ALTER TABLE "refresh_token" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "session" (
	"organisation_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"started_at" timestamp with time zone NOT NULL,
	"refreshed_at" timestamp with time zone NOT NULL,
	"ended_at" timestamp with time zone,
	"ended_because" text,
	CONSTRAINT "session_organisation_id_id_pk" PRIMARY KEY("organisation_id","id")
);
--> statement-breakpoint
ALTER TABLE "session" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "site" (
	"organisation_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"name" text NOT NULL,
	"address" text NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "site_organisation_id_id_pk" PRIMARY KEY("organisation_id","id")
);
--> statement-breakpoint
ALTER TABLE "site" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "throttle" (
	"bucket" text PRIMARY KEY NOT NULL,
	"level" double precision NOT NULL,
	"filled_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
ALTER TABLE "case_row" ADD CONSTRAINT "case_row_organisation_id_lift_id_lift_organisation_id_id_fk" FOREIGN KEY ("organisation_id","lift_id") REFERENCES "public"."lift"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "case_row" ADD CONSTRAINT "case_row_organisation_id_opened_by_person_organisation_id_id_fk" FOREIGN KEY ("organisation_id","opened_by") REFERENCES "public"."person"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "circuit" ADD CONSTRAINT "circuit_organisation_id_organisation_organisation_id_fk" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisation"("organisation_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "circuit_revision" ADD CONSTRAINT "circuit_revision_organisation_id_circuit_id_circuit_organisation_id_id_fk" FOREIGN KEY ("organisation_id","circuit_id") REFERENCES "public"."circuit"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "case_event" ADD CONSTRAINT "case_event_organisation_id_actor_person_organisation_id_id_fk" FOREIGN KEY ("organisation_id","actor") REFERENCES "public"."person"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "counter" ADD CONSTRAINT "counter_organisation_id_organisation_organisation_id_fk" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisation"("organisation_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "quarantine" ADD CONSTRAINT "quarantine_organisation_id_person_id_person_organisation_id_id_fk" FOREIGN KEY ("organisation_id","person_id") REFERENCES "public"."person"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "audit" ADD CONSTRAINT "audit_organisation_id_actor_person_organisation_id_id_fk" FOREIGN KEY ("organisation_id","actor") REFERENCES "public"."person"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "audit_head" ADD CONSTRAINT "audit_head_organisation_id_organisation_organisation_id_fk" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisation"("organisation_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "idempotency" ADD CONSTRAINT "idempotency_organisation_id_person_id_person_organisation_id_id_fk" FOREIGN KEY ("organisation_id","person_id") REFERENCES "public"."person"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lift" ADD CONSTRAINT "lift_organisation_id_site_id_site_organisation_id_id_fk" FOREIGN KEY ("organisation_id","site_id") REFERENCES "public"."site"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lift" ADD CONSTRAINT "lift_organisation_id_circuit_id_circuit_revision_circuit_revision_organisation_id_circuit_id_revision_fk" FOREIGN KEY ("organisation_id","circuit_id","circuit_revision") REFERENCES "public"."circuit_revision"("organisation_id","circuit_id","revision") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "person" ADD CONSTRAINT "person_organisation_id_organisation_organisation_id_fk" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisation"("organisation_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "person_details" ADD CONSTRAINT "person_details_organisation_id_person_id_person_organisation_id_id_fk" FOREIGN KEY ("organisation_id","person_id") REFERENCES "public"."person"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "refresh_token" ADD CONSTRAINT "refresh_token_organisation_id_session_id_session_organisation_id_id_fk" FOREIGN KEY ("organisation_id","session_id") REFERENCES "public"."session"("organisation_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "session" ADD CONSTRAINT "session_organisation_id_person_id_person_organisation_id_id_fk" FOREIGN KEY ("organisation_id","person_id") REFERENCES "public"."person"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "site" ADD CONSTRAINT "site_organisation_id_organisation_organisation_id_fk" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisation"("organisation_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "case_row_by_lift" ON "case_row" USING btree ("organisation_id","lift_id","opened_at");--> statement-breakpoint
CREATE INDEX "case_row_by_status" ON "case_row" USING btree ("organisation_id","status","opened_at");--> statement-breakpoint
CREATE INDEX "quarantine_by_time" ON "quarantine" USING btree ("organisation_id","received_at");--> statement-breakpoint
CREATE INDEX "idempotency_by_age" ON "idempotency" USING btree ("organisation_id","created_at");--> statement-breakpoint
CREATE UNIQUE INDEX "person_details_email_everywhere" ON "person_details" USING btree (lower("email"));--> statement-breakpoint
CREATE INDEX "refresh_token_by_session" ON "refresh_token" USING btree ("organisation_id","session_id");--> statement-breakpoint
CREATE INDEX "session_by_person" ON "session" USING btree ("organisation_id","person_id");--> statement-breakpoint
CREATE POLICY "organisation_only" ON "case_row" AS PERMISSIVE FOR ALL TO "lampline_app" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisation_only" ON "circuit" AS PERMISSIVE FOR ALL TO "lampline_app" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisation_only" ON "circuit_revision" AS PERMISSIVE FOR ALL TO "lampline_app" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisation_only" ON "case_event" AS PERMISSIVE FOR ALL TO "lampline_app" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisation_only" ON "counter" AS PERMISSIVE FOR ALL TO "lampline_app" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisation_only" ON "quarantine" AS PERMISSIVE FOR ALL TO "lampline_app" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisation_only" ON "audit" AS PERMISSIVE FOR ALL TO "lampline_app" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisation_only" ON "audit_head" AS PERMISSIVE FOR ALL TO "lampline_app" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisation_only" ON "idempotency" AS PERMISSIVE FOR ALL TO "lampline_app" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisation_only" ON "lift" AS PERMISSIVE FOR ALL TO "lampline_app" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisation_only" ON "organisation" AS PERMISSIVE FOR ALL TO "lampline_app" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisation_only" ON "person" AS PERMISSIVE FOR ALL TO "lampline_app" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisation_only" ON "person_details" AS PERMISSIVE FOR ALL TO "lampline_app" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisation_only" ON "refresh_token" AS PERMISSIVE FOR ALL TO "lampline_app" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisation_only" ON "session" AS PERMISSIVE FOR ALL TO "lampline_app" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisation_only" ON "site" AS PERMISSIVE FOR ALL TO "lampline_app" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);