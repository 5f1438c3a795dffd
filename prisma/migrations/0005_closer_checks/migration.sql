-- By hand: what the first checks let through: sums that are not numbers, unknown words, people of another club.
-- NaN is above every number for PostgreSQL, so a lower bound alone lets it pass.
ALTER TABLE "session_weight" DROP CONSTRAINT "session_weight_minutes_not_negative";
ALTER TABLE "session_weight" ADD CONSTRAINT "session_weight_minutes_not_negative" CHECK (("moderate_min" IS NULL OR "moderate_min" >= 0 AND "moderate_min" < 'Infinity') AND ("heavy_min" IS NULL OR "heavy_min" >= 0 AND "heavy_min" < 'Infinity') AND ("severe_min" IS NULL OR "severe_min" >= 0 AND "severe_min" < 'Infinity') AND ("extreme_min" IS NULL OR "extreme_min" >= 0 AND "extreme_min" < 'Infinity') AND ("unassigned_min" IS NULL OR "unassigned_min" >= 0 AND "unassigned_min" < 'Infinity') AND ("rating_load" IS NULL OR "rating_load" >= 0 AND "rating_load" < 'Infinity') AND ("domain_load" IS NULL OR "domain_load" >= 0 AND "domain_load" < 'Infinity'));
ALTER TABLE "session_weight" ADD CONSTRAINT "session_weight_basis_known" CHECK ("basis" IN ('power', 'speed', 'interval', 'minutes', 'heart-rate', 'rating'));
ALTER TABLE "daily_total" DROP CONSTRAINT "daily_total_not_negative";
ALTER TABLE "daily_total" ADD CONSTRAINT "daily_total_not_negative" CHECK (("minutes" IS NULL OR "minutes" >= 0 AND "minutes" < 'Infinity') AND ("rating_load" IS NULL OR "rating_load" >= 0 AND "rating_load" < 'Infinity') AND ("domain_load" IS NULL OR "domain_load" >= 0 AND "domain_load" < 'Infinity') AND ("moderate_min" IS NULL OR "moderate_min" >= 0 AND "moderate_min" < 'Infinity') AND ("heavy_min" IS NULL OR "heavy_min" >= 0 AND "heavy_min" < 'Infinity') AND ("severe_min" IS NULL OR "severe_min" >= 0 AND "severe_min" < 'Infinity') AND ("extreme_min" IS NULL OR "extreme_min" >= 0 AND "extreme_min" < 'Infinity') AND ("applicable_min" IS NULL OR "applicable_min" >= 0 AND "applicable_min" < 'Infinity') AND ("covered_min" IS NULL OR "covered_min" >= 0 AND "covered_min" < 'Infinity') AND least("sessions", "rating_missing", "domain_missing", "suspect") >= 0);
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_modality_known" CHECK ("modality" IN ('rowing', 'cycling', 'running', 'swimming', 'skiing', 'strength', 'games', 'other'));
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_setting_known" CHECK ("setting" IN ('any', 'ergometer', 'water', 'road', 'track', 'treadmill', 'trail', 'pool', 'open-water', 'snow', 'gym'));
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_rating_by_known" CHECK ("rating_by" IN ('athlete', 'staff'));
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_version_range" CHECK ("version" >= 1);
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_mean_below_peak" CHECK ("mean_heart_rate_bpm" <= "peak_heart_rate_bpm");
ALTER TABLE "threshold_value" ADD CONSTRAINT "threshold_value_modality_known" CHECK ("modality" IN ('rowing', 'cycling', 'running', 'swimming', 'skiing', 'strength', 'games', 'other'));
ALTER TABLE "threshold_value" ADD CONSTRAINT "threshold_value_setting_known" CHECK ("setting" IN ('any', 'ergometer', 'water', 'road', 'track', 'treadmill', 'trail', 'pool', 'open-water', 'snow', 'gym'));
ALTER TABLE "squad" ADD CONSTRAINT "squad_name_length" CHECK (char_length("name") BETWEEN 1 AND 200);
ALTER TABLE "reweigh_task" ADD CONSTRAINT "reweigh_task_state_known" CHECK ("state" IN ('waiting', 'running', 'done'));
ALTER TABLE "reweigh_task" ADD CONSTRAINT "reweigh_task_counts_range" CHECK ("total" >= 0 AND "done" >= 0);
ALTER TABLE "report" DROP CONSTRAINT "report_iso_week_shape";
ALTER TABLE "report" ADD CONSTRAINT "report_iso_week_shape" CHECK ("iso_week" ~ '^2[01][0-9]{2}-W(0[1-9]|[1-4][0-9]|5[0-3])$');

-- By hand: whoever did it is a person of the club.
ALTER TABLE "training_session" ADD CONSTRAINT "training_session_entered_by_fk" FOREIGN KEY ("club_id", "entered_by") REFERENCES "person" ("club_id", "id");
ALTER TABLE "session_revision" ADD CONSTRAINT "session_revision_changed_by_fk" FOREIGN KEY ("club_id", "changed_by") REFERENCES "person" ("club_id", "id");
ALTER TABLE "threshold_value" ADD CONSTRAINT "threshold_value_entered_by_fk" FOREIGN KEY ("club_id", "entered_by") REFERENCES "person" ("club_id", "id");
ALTER TABLE "threshold_value" ADD CONSTRAINT "threshold_value_withdrawn_by_fk" FOREIGN KEY ("club_id", "withdrawn_by") REFERENCES "person" ("club_id", "id");
ALTER TABLE "day_closing" ADD CONSTRAINT "day_closing_closed_by_fk" FOREIGN KEY ("club_id", "closed_by") REFERENCES "person" ("club_id", "id");
ALTER TABLE "availability" ADD CONSTRAINT "availability_entered_by_fk" FOREIGN KEY ("club_id", "entered_by") REFERENCES "person" ("club_id", "id");
ALTER TABLE "load_period" ADD CONSTRAINT "load_period_entered_by_fk" FOREIGN KEY ("club_id", "entered_by") REFERENCES "person" ("club_id", "id");
ALTER TABLE "load_policy" ADD CONSTRAINT "load_policy_created_by_fk" FOREIGN KEY ("club_id", "created_by") REFERENCES "person" ("club_id", "id");
ALTER TABLE "report" ADD CONSTRAINT "report_made_by_fk" FOREIGN KEY ("club_id", "made_by") REFERENCES "person" ("club_id", "id");
ALTER TABLE "idempotency_key" ADD CONSTRAINT "idempotency_key_person_id_fk" FOREIGN KEY ("club_id", "person_id") REFERENCES "person" ("club_id", "id");
ALTER TABLE "audit_entry" ADD CONSTRAINT "audit_entry_person_id_fk" FOREIGN KEY ("club_id", "person_id") REFERENCES "person" ("club_id", "id");
ALTER TABLE "morning_answer" ADD CONSTRAINT "morning_answer_entered_by_fk" FOREIGN KEY ("club_id", "entered_by") REFERENCES "person" ("club_id", "id");
ALTER TABLE "morning_revision" ADD CONSTRAINT "morning_revision_changed_by_fk" FOREIGN KEY ("club_id", "changed_by") REFERENCES "person" ("club_id", "id");
ALTER TABLE "circumstance" ADD CONSTRAINT "circumstance_entered_by_fk" FOREIGN KEY ("club_id", "entered_by") REFERENCES "person" ("club_id", "id");
ALTER TABLE "test_definition" ADD CONSTRAINT "test_definition_created_by_fk" FOREIGN KEY ("club_id", "created_by") REFERENCES "person" ("club_id", "id");
ALTER TABLE "test_result" ADD CONSTRAINT "test_result_entered_by_fk" FOREIGN KEY ("club_id", "entered_by") REFERENCES "person" ("club_id", "id");
ALTER TABLE "test_result" ADD CONSTRAINT "test_result_withdrawn_by_fk" FOREIGN KEY ("club_id", "withdrawn_by") REFERENCES "person" ("club_id", "id");
