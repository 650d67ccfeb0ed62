CREATE SCHEMA "identity";
--> statement-breakpoint
CREATE TABLE "audit_events" (
	"firm_id" uuid NOT NULL,
	"sequence" bigint DEFAULT 0 NOT NULL,
	"at" timestamp with time zone NOT NULL,
	"actor_user_id" text NOT NULL,
	"actor_name" text NOT NULL,
	"act" text NOT NULL,
	"subject_kind" text NOT NULL,
	"subject_id" text NOT NULL,
	"details" jsonb NOT NULL,
	"previous_hash" text DEFAULT '' NOT NULL,
	"hash" text DEFAULT '' NOT NULL,
	CONSTRAINT "audit_events_firm_id_sequence_pk" PRIMARY KEY("firm_id","sequence")
);
--> statement-breakpoint
CREATE TABLE "audit_heads" (
	"firm_id" uuid PRIMARY KEY NOT NULL,
	"sequence" bigint NOT NULL,
	"hash" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "contributions" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"entity" text NOT NULL,
	"entity_id" uuid NOT NULL,
	"user_id" text NOT NULL,
	"at" timestamp with time zone NOT NULL,
	CONSTRAINT "contributions_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "cables" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"structure_id" uuid NOT NULL,
	"section_id" uuid NOT NULL,
	"reference" text NOT NULL,
	"owner_reference" text DEFAULT '' NOT NULL,
	"painted_mark" text DEFAULT '' NOT NULL,
	"kind" text NOT NULL,
	"position" integer NOT NULL,
	"lower_anchor" jsonb,
	"upper_anchor" jsonb,
	"notes" text DEFAULT '' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "cables_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "cables_reference" UNIQUE("firm_id","structure_id","reference")
);
--> statement-breakpoint
CREATE TABLE "reference_tensions" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"cable_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"stage" text NOT NULL,
	"place" text NOT NULL,
	"value" double precision NOT NULL,
	"relative_uncertainty" double precision,
	"source" text NOT NULL,
	"dated" text,
	"retired_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "reference_tensions_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "sections" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"structure_id" uuid NOT NULL,
	"name" text NOT NULL,
	"strand_key" text,
	"strand_count" integer,
	"steel_area" double precision NOT NULL,
	"modulus" double precision NOT NULL,
	"modulus_source" text NOT NULL,
	"steel_mass" double precision NOT NULL,
	"steel_mass_source" text NOT NULL,
	"sheath_mass" double precision NOT NULL,
	"grout_mass" double precision NOT NULL,
	"added_mass_source" text NOT NULL,
	"mass_relative_uncertainty" double precision,
	"bending_stiffness_low" double precision NOT NULL,
	"bending_stiffness_high" double precision NOT NULL,
	"breaking_load" double precision NOT NULL,
	"breaking_load_source" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "sections_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "spans" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"cable_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"name" text DEFAULT '' NOT NULL,
	"chord_length" double precision NOT NULL,
	"chord_length_source" text NOT NULL,
	"chord_length_tolerance" double precision NOT NULL,
	"lower_deduction" double precision NOT NULL,
	"lower_deduction_tolerance" double precision NOT NULL,
	"upper_deduction" double precision NOT NULL,
	"upper_deduction_tolerance" double precision NOT NULL,
	"deduction_source" text NOT NULL,
	"inclination" double precision NOT NULL,
	"lower_end" jsonb NOT NULL,
	"upper_end" jsonb NOT NULL,
	"lower_damper" text NOT NULL,
	"upper_damper" text NOT NULL,
	"damper_position" double precision,
	"retired_at" timestamp with time zone,
	CONSTRAINT "spans_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "campaign_cables" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"campaign_id" uuid NOT NULL,
	"cable_id" uuid NOT NULL,
	"not_measured_reason" text,
	CONSTRAINT "campaign_cables_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "campaign_cables_once" UNIQUE("firm_id","campaign_id","cable_id")
);
--> statement-breakpoint
CREATE TABLE "campaigns" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"structure_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"name" text NOT NULL,
	"starts_on" text NOT NULL,
	"ends_on" text,
	"crew" text DEFAULT '' NOT NULL,
	"instruments" jsonb NOT NULL,
	"weather" text DEFAULT '' NOT NULL,
	"steel_temperature" double precision,
	"air_temperature" double precision,
	"traffic" text DEFAULT '' NOT NULL,
	"stage" text NOT NULL,
	"basis" jsonb NOT NULL,
	"state" text DEFAULT 'open' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "campaigns_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "campaigns_number" UNIQUE("firm_id","structure_id","number")
);
--> statement-breakpoint
CREATE TABLE "clients" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"name" text NOT NULL,
	"contact_name" text DEFAULT '' NOT NULL,
	"contact_email" text DEFAULT '' NOT NULL,
	"address" text DEFAULT '' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "clients_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "estimates" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"measurement_id" uuid NOT NULL,
	"span_id" uuid NOT NULL,
	"campaign_id" uuid NOT NULL,
	"engine_version" text NOT NULL,
	"input" jsonb NOT NULL,
	"output" jsonb NOT NULL,
	"input_sha256" text NOT NULL,
	"created_by" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "estimates_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "file_chunks" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"file_id" uuid NOT NULL,
	"index" integer NOT NULL,
	"data" "bytea" NOT NULL,
	CONSTRAINT "file_chunks_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "file_chunks_place" UNIQUE("firm_id","file_id","index")
);
--> statement-breakpoint
CREATE TABLE "files" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"kind" text NOT NULL,
	"name" text NOT NULL,
	"media_type" text NOT NULL,
	"bytes" integer NOT NULL,
	"sha256" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "files_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "firms" (
	"id" uuid PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"time_zone" text NOT NULL,
	"letterhead" jsonb NOT NULL,
	"report_prefix" text DEFAULT 'SN-' NOT NULL,
	"next_report_number" integer DEFAULT 1 NOT NULL,
	"demonstration" boolean DEFAULT false NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "invitations" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"roles" text[] NOT NULL,
	"client_id" uuid,
	"token_sha256" text NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"accepted_at" timestamp with time zone,
	"revoked_at" timestamp with time zone,
	"invited_by" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "invitations_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "invitations_token_sha256_unique" UNIQUE("token_sha256")
);
--> statement-breakpoint
CREATE TABLE "members" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"user_id" text NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"roles" text[] NOT NULL,
	"client_id" uuid,
	"licence_number" text DEFAULT '' NOT NULL,
	"licence_jurisdiction" text DEFAULT '' NOT NULL,
	"active" boolean DEFAULT true NOT NULL,
	"units" text DEFAULT 'si' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "members_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "members_user" UNIQUE("firm_id","user_id")
);
--> statement-breakpoint
CREATE TABLE "identity"."account" (
	"id" text PRIMARY KEY NOT NULL,
	"account_id" text NOT NULL,
	"provider_id" text NOT NULL,
	"user_id" text NOT NULL,
	"access_token" text,
	"refresh_token" text,
	"id_token" text,
	"access_token_expires_at" timestamp with time zone,
	"refresh_token_expires_at" timestamp with time zone,
	"scope" text,
	"password" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "identity"."rate_limit" (
	"id" text PRIMARY KEY NOT NULL,
	"key" text NOT NULL,
	"count" integer NOT NULL,
	"last_request" bigint NOT NULL,
	CONSTRAINT "rate_limit_key_unique" UNIQUE("key")
);
--> statement-breakpoint
CREATE TABLE "identity"."session" (
	"id" text PRIMARY KEY NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"token" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone NOT NULL,
	"ip_address" text,
	"user_agent" text,
	"user_id" text NOT NULL,
	CONSTRAINT "session_token_unique" UNIQUE("token")
);
--> statement-breakpoint
CREATE TABLE "identity"."user" (
	"id" text PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"email_verified" boolean DEFAULT false NOT NULL,
	"image" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "user_email_unique" UNIQUE("email")
);
--> statement-breakpoint
CREATE TABLE "identity"."verification" (
	"id" text PRIMARY KEY NOT NULL,
	"identifier" text NOT NULL,
	"value" text NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "measurements" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"campaign_id" uuid NOT NULL,
	"span_id" uuid NOT NULL,
	"visited_at" timestamp with time zone NOT NULL,
	"sensor_position" double precision,
	"excitation" text NOT NULL,
	"lower_damper_state" text NOT NULL,
	"upper_damper_state" text NOT NULL,
	"bushing_state" text NOT NULL,
	"cross_tied" boolean NOT NULL,
	"steel_temperature" double precision,
	"note" text DEFAULT '' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"entered_by" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "measurements_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "modal_peaks" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"measurement_id" uuid NOT NULL,
	"mode" integer NOT NULL,
	"frequency" double precision NOT NULL,
	"standard_uncertainty" double precision,
	"plane" text NOT NULL,
	"source" text NOT NULL,
	"used" boolean NOT NULL,
	"set_aside_reason" text,
	CONSTRAINT "modal_peaks_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "cable_checks" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"cable_id" uuid NOT NULL,
	"checked_by" text NOT NULL,
	"checked_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "cable_checks_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "cable_checks_once" UNIQUE("firm_id","submission_id","cable_id")
);
--> statement-breakpoint
CREATE TABLE "check_comments" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"cable_id" uuid,
	"field" text DEFAULT '' NOT NULL,
	"text" text NOT NULL,
	"author_user_id" text NOT NULL,
	"state" text DEFAULT 'open' NOT NULL,
	"answer" text,
	"answered_by" text,
	"answered_at" timestamp with time zone,
	"closed_by" text,
	"closed_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "check_comments_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "reports" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"campaign_id" uuid NOT NULL,
	"client_id" uuid NOT NULL,
	"number" text NOT NULL,
	"title" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "reports_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "reports_number" UNIQUE("firm_id","number")
);
--> statement-breakpoint
CREATE TABLE "revision_cables" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"cable_id" uuid NOT NULL,
	CONSTRAINT "revision_cables_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "revision_cables_once" UNIQUE("firm_id","revision_id","cable_id")
);
--> statement-breakpoint
CREATE TABLE "revisions" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"report_id" uuid NOT NULL,
	"letter" text NOT NULL,
	"state" text DEFAULT 'draft' NOT NULL,
	"author_user_id" text NOT NULL,
	"deputy_user_id" text,
	"texts" jsonb NOT NULL,
	"text_version" integer DEFAULT 1 NOT NULL,
	"addressed_client_id" uuid,
	"verification_code" text NOT NULL,
	"approved_submission_id" uuid,
	"unsigned_file_id" uuid,
	"signed_file_id" uuid,
	"approved_at" timestamp with time zone,
	"issued_at" timestamp with time zone,
	"superseded_at" timestamp with time zone,
	"superseded_by" uuid,
	"withdrawn_at" timestamp with time zone,
	"withdrawn_reason" text,
	"returned_reason" text,
	"changed_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "revisions_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "revisions_verification_code_unique" UNIQUE("verification_code"),
	CONSTRAINT "revisions_letter" UNIQUE("firm_id","report_id","letter")
);
--> statement-breakpoint
CREATE TABLE "signatures" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"meaning" text NOT NULL,
	"user_id" text NOT NULL,
	"name" text NOT NULL,
	"licence_number" text DEFAULT '' NOT NULL,
	"jurisdiction" text DEFAULT '' NOT NULL,
	"statement" text NOT NULL,
	"content_sha256" text NOT NULL,
	"signed_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "signatures_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "submission_sources" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"entity" text NOT NULL,
	"entity_id" uuid NOT NULL,
	CONSTRAINT "submission_sources_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "submission_sources_once" UNIQUE("firm_id","submission_id","entity","entity_id")
);
--> statement-breakpoint
CREATE TABLE "submissions" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"content" text NOT NULL,
	"content_sha256" text NOT NULL,
	"submitted_by" text NOT NULL,
	"submitted_at" timestamp with time zone DEFAULT now() NOT NULL,
	"frozen_at" timestamp with time zone DEFAULT clock_timestamp() NOT NULL,
	CONSTRAINT "submissions_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "submissions_number" UNIQUE("firm_id","revision_id","number")
);
--> statement-breakpoint
CREATE TABLE "structures" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"name" text NOT NULL,
	"reference" text DEFAULT '' NOT NULL,
	"kind" text NOT NULL,
	"owner_name" text DEFAULT '' NOT NULL,
	"client_id" uuid,
	"place" text DEFAULT '' NOT NULL,
	"time_zone" text NOT NULL,
	"elevation" jsonb,
	"notes" text DEFAULT '' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "structures_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
ALTER TABLE "cables" ADD CONSTRAINT "cables_structure" FOREIGN KEY ("firm_id","structure_id") REFERENCES "public"."structures"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cables" ADD CONSTRAINT "cables_section" FOREIGN KEY ("firm_id","section_id") REFERENCES "public"."sections"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reference_tensions" ADD CONSTRAINT "reference_tensions_cable" FOREIGN KEY ("firm_id","cable_id") REFERENCES "public"."cables"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sections" ADD CONSTRAINT "sections_structure" FOREIGN KEY ("firm_id","structure_id") REFERENCES "public"."structures"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "spans" ADD CONSTRAINT "spans_cable" FOREIGN KEY ("firm_id","cable_id") REFERENCES "public"."cables"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "campaign_cables" ADD CONSTRAINT "campaign_cables_campaign" FOREIGN KEY ("firm_id","campaign_id") REFERENCES "public"."campaigns"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "campaign_cables" ADD CONSTRAINT "campaign_cables_cable" FOREIGN KEY ("firm_id","cable_id") REFERENCES "public"."cables"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "campaigns" ADD CONSTRAINT "campaigns_structure" FOREIGN KEY ("firm_id","structure_id") REFERENCES "public"."structures"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "estimates" ADD CONSTRAINT "estimates_measurement" FOREIGN KEY ("firm_id","measurement_id") REFERENCES "public"."measurements"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "estimates" ADD CONSTRAINT "estimates_span" FOREIGN KEY ("firm_id","span_id") REFERENCES "public"."spans"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "estimates" ADD CONSTRAINT "estimates_campaign" FOREIGN KEY ("firm_id","campaign_id") REFERENCES "public"."campaigns"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "file_chunks" ADD CONSTRAINT "file_chunks_file" FOREIGN KEY ("firm_id","file_id") REFERENCES "public"."files"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_client" FOREIGN KEY ("firm_id","client_id") REFERENCES "public"."clients"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "members" ADD CONSTRAINT "members_client" FOREIGN KEY ("firm_id","client_id") REFERENCES "public"."clients"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "identity"."account" ADD CONSTRAINT "account_user_id_user_id_fk" FOREIGN KEY ("user_id") REFERENCES "identity"."user"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "identity"."session" ADD CONSTRAINT "session_user_id_user_id_fk" FOREIGN KEY ("user_id") REFERENCES "identity"."user"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "measurements" ADD CONSTRAINT "measurements_campaign" FOREIGN KEY ("firm_id","campaign_id") REFERENCES "public"."campaigns"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "measurements" ADD CONSTRAINT "measurements_span" FOREIGN KEY ("firm_id","span_id") REFERENCES "public"."spans"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "modal_peaks" ADD CONSTRAINT "modal_peaks_measurement" FOREIGN KEY ("firm_id","measurement_id") REFERENCES "public"."measurements"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cable_checks" ADD CONSTRAINT "cable_checks_submission" FOREIGN KEY ("firm_id","submission_id") REFERENCES "public"."submissions"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cable_checks" ADD CONSTRAINT "cable_checks_cable" FOREIGN KEY ("firm_id","cable_id") REFERENCES "public"."cables"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "check_comments" ADD CONSTRAINT "check_comments_revision" FOREIGN KEY ("firm_id","revision_id") REFERENCES "public"."revisions"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "check_comments" ADD CONSTRAINT "check_comments_submission" FOREIGN KEY ("firm_id","submission_id") REFERENCES "public"."submissions"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "check_comments" ADD CONSTRAINT "check_comments_cable" FOREIGN KEY ("firm_id","cable_id") REFERENCES "public"."cables"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reports" ADD CONSTRAINT "reports_campaign" FOREIGN KEY ("firm_id","campaign_id") REFERENCES "public"."campaigns"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reports" ADD CONSTRAINT "reports_client" FOREIGN KEY ("firm_id","client_id") REFERENCES "public"."clients"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_cables" ADD CONSTRAINT "revision_cables_revision" FOREIGN KEY ("firm_id","revision_id") REFERENCES "public"."revisions"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_cables" ADD CONSTRAINT "revision_cables_cable" FOREIGN KEY ("firm_id","cable_id") REFERENCES "public"."cables"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_report" FOREIGN KEY ("firm_id","report_id") REFERENCES "public"."reports"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_client" FOREIGN KEY ("firm_id","addressed_client_id") REFERENCES "public"."clients"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_unsigned_file" FOREIGN KEY ("firm_id","unsigned_file_id") REFERENCES "public"."files"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_signed_file" FOREIGN KEY ("firm_id","signed_file_id") REFERENCES "public"."files"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "signatures" ADD CONSTRAINT "signatures_submission" FOREIGN KEY ("firm_id","submission_id") REFERENCES "public"."submissions"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "signatures" ADD CONSTRAINT "signatures_revision" FOREIGN KEY ("firm_id","revision_id") REFERENCES "public"."revisions"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_sources" ADD CONSTRAINT "submission_sources_submission" FOREIGN KEY ("firm_id","submission_id") REFERENCES "public"."submissions"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submissions" ADD CONSTRAINT "submissions_revision" FOREIGN KEY ("firm_id","revision_id") REFERENCES "public"."revisions"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "structures" ADD CONSTRAINT "structures_client" FOREIGN KEY ("firm_id","client_id") REFERENCES "public"."clients"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "audit_events_by_subject" ON "audit_events" USING btree ("firm_id","subject_kind","subject_id");--> statement-breakpoint
CREATE INDEX "contributions_by_entity" ON "contributions" USING btree ("firm_id","entity","entity_id");--> statement-breakpoint
CREATE INDEX "reference_tensions_by_cable" ON "reference_tensions" USING btree ("firm_id","cable_id");--> statement-breakpoint
CREATE INDEX "spans_by_cable" ON "spans" USING btree ("firm_id","cable_id");--> statement-breakpoint
CREATE INDEX "campaign_cables_by_cable" ON "campaign_cables" USING btree ("firm_id","cable_id");--> statement-breakpoint
CREATE INDEX "estimates_by_measurement" ON "estimates" USING btree ("firm_id","measurement_id","created_at");--> statement-breakpoint
CREATE INDEX "estimates_by_span" ON "estimates" USING btree ("firm_id","span_id","created_at");--> statement-breakpoint
CREATE INDEX "files_by_hash" ON "files" USING btree ("sha256");--> statement-breakpoint
CREATE INDEX "members_by_user" ON "members" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "account_user_id_index" ON "identity"."account" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "session_user_id_index" ON "identity"."session" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "verification_identifier_index" ON "identity"."verification" USING btree ("identifier");--> statement-breakpoint
CREATE INDEX "measurements_by_campaign" ON "measurements" USING btree ("firm_id","campaign_id");--> statement-breakpoint
CREATE INDEX "measurements_by_span" ON "measurements" USING btree ("firm_id","span_id");--> statement-breakpoint
CREATE INDEX "modal_peaks_by_measurement" ON "modal_peaks" USING btree ("firm_id","measurement_id");--> statement-breakpoint
CREATE INDEX "check_comments_by_revision" ON "check_comments" USING btree ("firm_id","revision_id");--> statement-breakpoint
CREATE UNIQUE INDEX "revisions_one_current" ON "revisions" USING btree ("firm_id","report_id") WHERE state = 'issued';--> statement-breakpoint
CREATE UNIQUE INDEX "revisions_one_open" ON "revisions" USING btree ("firm_id","report_id") WHERE state in ('draft', 'in check', 'returned', 'approved');--> statement-breakpoint
CREATE INDEX "signatures_by_revision" ON "signatures" USING btree ("firm_id","revision_id");--> statement-breakpoint
CREATE INDEX "submission_sources_by_entity" ON "submission_sources" USING btree ("firm_id","entity","entity_id");