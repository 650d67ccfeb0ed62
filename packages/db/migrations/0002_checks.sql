ALTER TABLE "revisions" ADD CONSTRAINT "revisions_approved_submission" FOREIGN KEY ("firm_id","approved_submission_id") REFERENCES "public"."submissions"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_superseded_by" FOREIGN KEY ("firm_id","superseded_by") REFERENCES "public"."revisions"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "sections_by_structure" ON "sections" USING btree ("firm_id","structure_id");--> statement-breakpoint
CREATE INDEX "estimates_by_campaign" ON "estimates" USING btree ("firm_id","campaign_id");--> statement-breakpoint
CREATE UNIQUE INDEX "modal_peaks_mode_used_once" ON "modal_peaks" USING btree ("firm_id","measurement_id","mode","plane") WHERE used;--> statement-breakpoint
CREATE INDEX "reports_by_campaign" ON "reports" USING btree ("firm_id","campaign_id");--> statement-breakpoint
ALTER TABLE "cables" ADD CONSTRAINT "kind_is_known" CHECK ("cables"."kind" in ('stay', 'hanger', 'external-tendon', 'tie-rod', 'guy'));--> statement-breakpoint
ALTER TABLE "reference_tensions" ADD CONSTRAINT "kind_is_known" CHECK ("reference_tensions"."kind" in ('design', 'lift-off', 'load-cell', 'last-survey', 'sister'));--> statement-breakpoint
ALTER TABLE "reference_tensions" ADD CONSTRAINT "place_is_known" CHECK ("reference_tensions"."place" in ('mean-chord', 'lower-end', 'upper-end'));--> statement-breakpoint
ALTER TABLE "reference_tensions" ADD CONSTRAINT "reference_tensions_positive" CHECK ("reference_tensions"."value" > 0 and "reference_tensions"."value" < 'Infinity');--> statement-breakpoint
ALTER TABLE "reference_tensions" ADD CONSTRAINT "reference_tensions_not_negative" CHECK ("reference_tensions"."relative_uncertainty" >= 0 and "reference_tensions"."relative_uncertainty" < 'Infinity');--> statement-breakpoint
ALTER TABLE "sections" ADD CONSTRAINT "modulus_source_is_known" CHECK ("sections"."modulus_source" in ('weighed', 'supplier', 'as-built', 'design', 'taped', 'assumed'));--> statement-breakpoint
ALTER TABLE "sections" ADD CONSTRAINT "steel_mass_source_is_known" CHECK ("sections"."steel_mass_source" in ('weighed', 'supplier', 'as-built', 'design', 'taped', 'assumed'));--> statement-breakpoint
ALTER TABLE "sections" ADD CONSTRAINT "added_mass_source_is_known" CHECK ("sections"."added_mass_source" in ('weighed', 'supplier', 'as-built', 'design', 'taped', 'assumed'));--> statement-breakpoint
ALTER TABLE "sections" ADD CONSTRAINT "breaking_load_source_is_known" CHECK ("sections"."breaking_load_source" in ('weighed', 'supplier', 'as-built', 'design', 'taped', 'assumed'));--> statement-breakpoint
ALTER TABLE "sections" ADD CONSTRAINT "sections_positive" CHECK ("sections"."steel_area" > 0 and "sections"."steel_area" < 'Infinity' and "sections"."modulus" > 0 and "sections"."modulus" < 'Infinity' and "sections"."steel_mass" > 0 and "sections"."steel_mass" < 'Infinity' and "sections"."bending_stiffness_low" > 0 and "sections"."bending_stiffness_low" < 'Infinity' and "sections"."breaking_load" > 0 and "sections"."breaking_load" < 'Infinity');--> statement-breakpoint
ALTER TABLE "sections" ADD CONSTRAINT "sections_uncertainty_is_never_zero" CHECK ("sections"."mass_relative_uncertainty" > 0 and "sections"."mass_relative_uncertainty" < 'Infinity');--> statement-breakpoint
ALTER TABLE "sections" ADD CONSTRAINT "sections_not_negative" CHECK ("sections"."sheath_mass" >= 0 and "sections"."sheath_mass" < 'Infinity' and "sections"."grout_mass" >= 0 and "sections"."grout_mass" < 'Infinity');--> statement-breakpoint
ALTER TABLE "sections" ADD CONSTRAINT "sections_bounds_in_order" CHECK ("sections"."bending_stiffness_low" <= "sections"."bending_stiffness_high" and "sections"."bending_stiffness_high" < 'Infinity');--> statement-breakpoint
ALTER TABLE "spans" ADD CONSTRAINT "chord_length_source_is_known" CHECK ("spans"."chord_length_source" in ('weighed', 'supplier', 'as-built', 'design', 'taped', 'assumed'));--> statement-breakpoint
ALTER TABLE "spans" ADD CONSTRAINT "deduction_source_is_known" CHECK ("spans"."deduction_source" in ('weighed', 'supplier', 'as-built', 'design', 'taped', 'assumed'));--> statement-breakpoint
ALTER TABLE "spans" ADD CONSTRAINT "lower_damper_is_known" CHECK ("spans"."lower_damper" in ('none', 'fitted'));--> statement-breakpoint
ALTER TABLE "spans" ADD CONSTRAINT "upper_damper_is_known" CHECK ("spans"."upper_damper" in ('none', 'fitted'));--> statement-breakpoint
ALTER TABLE "spans" ADD CONSTRAINT "spans_tolerances_are_never_zero" CHECK ("spans"."chord_length_tolerance" > 0 and "spans"."chord_length_tolerance" < 'Infinity' and "spans"."lower_deduction_tolerance" > 0 and "spans"."lower_deduction_tolerance" < 'Infinity' and "spans"."upper_deduction_tolerance" > 0 and "spans"."upper_deduction_tolerance" < 'Infinity');--> statement-breakpoint
ALTER TABLE "spans" ADD CONSTRAINT "spans_not_negative" CHECK ("spans"."lower_deduction" >= 0 and "spans"."lower_deduction" < 'Infinity' and "spans"."upper_deduction" >= 0 and "spans"."upper_deduction" < 'Infinity' and "spans"."inclination" >= 0 and "spans"."inclination" < 'Infinity');--> statement-breakpoint
ALTER TABLE "spans" ADD CONSTRAINT "spans_damper_position_positive" CHECK ("spans"."damper_position" > 0 and "spans"."damper_position" < 'Infinity');--> statement-breakpoint
ALTER TABLE "spans" ADD CONSTRAINT "spans_leave_a_free_length" CHECK ("spans"."chord_length" - "spans"."lower_deduction" - "spans"."upper_deduction" > 0 and "spans"."chord_length" < 'Infinity');--> statement-breakpoint
ALTER TABLE "campaigns" ADD CONSTRAINT "state_is_known" CHECK ("campaigns"."state" in ('open', 'closed'));--> statement-breakpoint
ALTER TABLE "campaigns" ADD CONSTRAINT "campaigns_number_from_one" CHECK ("campaigns"."number" >= 1);--> statement-breakpoint
ALTER TABLE "campaigns" ADD CONSTRAINT "campaigns_days_in_order" CHECK ("campaigns"."starts_on" ~ '^\d{4}-\d\d-\d\d$' and "campaigns"."ends_on" >= "campaigns"."starts_on");--> statement-breakpoint
ALTER TABLE "estimates" ADD CONSTRAINT "input_sha256_is_sha256" CHECK ("estimates"."input_sha256" ~ '^[0-9a-f]{64}$');--> statement-breakpoint
ALTER TABLE "file_chunks" ADD CONSTRAINT "file_chunks_at_most_one_mebibyte" CHECK (octet_length("file_chunks"."data") between 1 and 1048576 and "file_chunks"."index" >= 0);--> statement-breakpoint
ALTER TABLE "files" ADD CONSTRAINT "kind_is_known" CHECK ("files"."kind" in ('report-unsigned', 'report-signed', 'record'));--> statement-breakpoint
ALTER TABLE "files" ADD CONSTRAINT "sha256_is_sha256" CHECK ("files"."sha256" ~ '^[0-9a-f]{64}$');--> statement-breakpoint
ALTER TABLE "files" ADD CONSTRAINT "files_bytes_not_negative" CHECK ("files"."bytes" >= 0);--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_client_stands_alone" CHECK (cardinality("invitations"."roles") >= 1 and "invitations"."roles" <@ array['admin', 'engineer', 'checker', 'client'] and case when 'client' = any("invitations"."roles")
      then cardinality("invitations"."roles") = 1 and "invitations"."client_id" is not null else "invitations"."client_id" is null end);--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "token_sha256_is_sha256" CHECK ("invitations"."token_sha256" ~ '^[0-9a-f]{64}$');--> statement-breakpoint
ALTER TABLE "members" ADD CONSTRAINT "members_client_stands_alone" CHECK (cardinality("members"."roles") >= 1 and "members"."roles" <@ array['admin', 'engineer', 'checker', 'client'] and case when 'client' = any("members"."roles")
      then cardinality("members"."roles") = 1 and "members"."client_id" is not null else "members"."client_id" is null end);--> statement-breakpoint
ALTER TABLE "members" ADD CONSTRAINT "units_is_known" CHECK ("members"."units" in ('si', 'us'));--> statement-breakpoint
ALTER TABLE "measurements" ADD CONSTRAINT "excitation_is_known" CHECK ("measurements"."excitation" in ('ambient', 'wind', 'traffic', 'mallet', 'pull-release'));--> statement-breakpoint
ALTER TABLE "measurements" ADD CONSTRAINT "lower_damper_state_is_known" CHECK ("measurements"."lower_damper_state" in ('none', 'connected', 'disconnected', 'locked', 'leaking'));--> statement-breakpoint
ALTER TABLE "measurements" ADD CONSTRAINT "upper_damper_state_is_known" CHECK ("measurements"."upper_damper_state" in ('none', 'connected', 'disconnected', 'locked', 'leaking'));--> statement-breakpoint
ALTER TABLE "measurements" ADD CONSTRAINT "bushing_state_is_known" CHECK ("measurements"."bushing_state" in ('none', 'connected', 'disconnected', 'locked', 'leaking'));--> statement-breakpoint
ALTER TABLE "measurements" ADD CONSTRAINT "measurements_sensor_not_negative" CHECK ("measurements"."sensor_position" >= 0 and "measurements"."sensor_position" < 'Infinity');--> statement-breakpoint
ALTER TABLE "measurements" ADD CONSTRAINT "measurements_version_from_one" CHECK ("measurements"."version" >= 1);--> statement-breakpoint
ALTER TABLE "modal_peaks" ADD CONSTRAINT "plane_is_known" CHECK ("modal_peaks"."plane" in ('in-plane', 'out-of-plane'));--> statement-breakpoint
ALTER TABLE "modal_peaks" ADD CONSTRAINT "source_is_known" CHECK ("modal_peaks"."source" in ('typed', 'record'));--> statement-breakpoint
ALTER TABLE "modal_peaks" ADD CONSTRAINT "modal_peaks_mode_from_one" CHECK ("modal_peaks"."mode" >= 1);--> statement-breakpoint
ALTER TABLE "modal_peaks" ADD CONSTRAINT "modal_peaks_positive" CHECK ("modal_peaks"."frequency" > 0 and "modal_peaks"."frequency" < 'Infinity');--> statement-breakpoint
ALTER TABLE "modal_peaks" ADD CONSTRAINT "modal_peaks_uncertainty_is_never_zero" CHECK ("modal_peaks"."standard_uncertainty" > 0 and "modal_peaks"."standard_uncertainty" < 'Infinity');--> statement-breakpoint
ALTER TABLE "modal_peaks" ADD CONSTRAINT "modal_peaks_set_aside_with_a_reason" CHECK ("modal_peaks"."used" or "modal_peaks"."set_aside_reason" is not null);--> statement-breakpoint
ALTER TABLE "check_comments" ADD CONSTRAINT "state_is_known" CHECK ("check_comments"."state" in ('open', 'closed'));--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "state_is_known" CHECK ("revisions"."state" in ('draft', 'in check', 'returned', 'approved', 'issued', 'superseded', 'withdrawn'));--> statement-breakpoint
ALTER TABLE "signatures" ADD CONSTRAINT "meaning_is_known" CHECK ("signatures"."meaning" in ('prepared', 'checked and approved', 'issued'));--> statement-breakpoint
ALTER TABLE "signatures" ADD CONSTRAINT "content_sha256_is_sha256" CHECK ("signatures"."content_sha256" ~ '^[0-9a-f]{64}$');--> statement-breakpoint
ALTER TABLE "submissions" ADD CONSTRAINT "submissions_number_from_one" CHECK ("submissions"."number" >= 1);--> statement-breakpoint
ALTER TABLE "submissions" ADD CONSTRAINT "submissions_hash_of_the_content" CHECK ("submissions"."content_sha256" = encode(sha256(convert_to("submissions"."content", 'UTF8')), 'hex'));--> statement-breakpoint
ALTER TABLE "structures" ADD CONSTRAINT "kind_is_known" CHECK ("structures"."kind" in ('cable-stayed', 'arch', 'suspension', 'roof', 'mast', 'other'));