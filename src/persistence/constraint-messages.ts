/** What a broken constraint of the database means to the one who sent the data. */
export interface ConstraintMessage {
  field: string;
  allowed: string;
  hint?: string;
  /** conflict 409, rule 422, validation 400, not-found 404. */
  kind: 'conflict' | 'rule' | 'validation' | 'not-found';
  /** Stable word for clients where the one of the kind says too little. */
  code?: string;
}

/** By name of the constraint or unique index. Whoever adds a constraint adds its line here, and a test that breaks it. */
export const constraintMessages: Readonly<Record<string, ConstraintMessage>> = {
  club_external_key_key: { kind: 'conflict', field: 'Idempotency-Key', allowed: 'a key that made no club before' },
  club_name_length: { kind: 'validation', field: 'name', allowed: 'text of 1 to 200 characters' },

  person_club_id_email_key: { kind: 'conflict', field: 'email', allowed: 'a mail address nobody in the club has' },
  person_email_shape: { kind: 'validation', field: 'email', allowed: 'a mail address in small letters' },
  person_name_length: { kind: 'validation', field: 'name', allowed: 'text of 1 to 200 characters' },

  role_assignment_once: { kind: 'conflict', field: 'role', allowed: 'a role the person does not have yet' },
  role_assignment_person_fk: { kind: 'not-found', field: 'personId', allowed: 'a person of the club' },
  role_assignment_role_known: { kind: 'validation', field: 'role', allowed: 'a role of the service' },
  role_assignment_squad_fk: { kind: 'not-found', field: 'squadId', allowed: 'a squad of the club' },

  access_token_expires_later: { kind: 'validation', field: 'validDays', allowed: 'at least 1' },
  access_token_person_fk: { kind: 'not-found', field: 'personId', allowed: 'a person of the club' },

  squad_club_id_name_key: { kind: 'conflict', field: 'name', allowed: 'a name no squad of the club has' },

  load_policy_no_overlap: { kind: 'conflict', field: 'validFrom', allowed: 'days no other policy of the squad has' },
  load_policy_order: { kind: 'rule', field: 'validFrom', allowed: 'a date not after the last day' },
  load_policy_squad_fk: { kind: 'not-found', field: 'squadId', allowed: 'a squad of the club' },

  athlete_birth_year_range: { kind: 'validation', field: 'birthYear', allowed: 'a year from 1900 to 2100' },
  athlete_club_id_person_id_key: { kind: 'conflict', field: 'personId', allowed: 'a person who is no athlete yet' },
  athlete_name_length: { kind: 'validation', field: 'name', allowed: 'text of 1 to 200 characters' },
  athlete_person_fk: { kind: 'not-found', field: 'personId', allowed: 'a person of the club' },
  athlete_sex_known: { kind: 'validation', field: 'sex', allowed: 'female or male' },

  membership_athlete_fk: { kind: 'not-found', field: 'athleteId', allowed: 'an athlete of the club' },
  membership_no_overlap: {
    kind: 'conflict',
    field: 'from',
    allowed: 'days on which the athlete is in no squad',
    hint: 'End the present membership first.',
  },
  membership_order: { kind: 'rule', field: 'to', allowed: 'a date not before the first day' },
  membership_squad_fk: { kind: 'not-found', field: 'squadId', allowed: 'a squad of the club' },

  zone_period_athlete_fk: { kind: 'not-found', field: 'athleteId', allowed: 'an athlete of the club' },
  zone_period_no_overlap: { kind: 'conflict', field: 'from', allowed: 'days no other zone period of the athlete has' },
  zone_period_order: { kind: 'rule', field: 'to', allowed: 'a date not before the first day' },

  threshold_value_athlete_fk: { kind: 'not-found', field: 'athleteId', allowed: 'an athlete of the club' },
  threshold_value_error_range: {
    kind: 'validation',
    field: 'standardError',
    allowed: 'a number from 0 to below the value, in the unit of the value',
  },
  threshold_value_no_overlap: {
    kind: 'conflict',
    field: 'validFrom',
    allowed: 'a day from which no other value of the quantity, modality and setting is valid',
  },
  threshold_value_order: { kind: 'rule', field: 'validFrom', allowed: 'a date not after the last day' },
  threshold_value_range: { kind: 'validation', field: 'value', allowed: 'a number in the range of the quantity' },
  threshold_value_supersedes_fk: { kind: 'not-found', field: 'valueId', allowed: 'a value of the club' },

  training_session_athlete_fk: { kind: 'not-found', field: 'athleteId', allowed: 'an athlete of the club' },
  training_session_distance_range: { kind: 'validation', field: 'distanceM', allowed: 'above 0, at most 500000 m' },
  training_session_duration_range: { kind: 'validation', field: 'durationMin', allowed: 'above 0, at most 1440 min' },
  training_session_external_once: {
    kind: 'conflict',
    field: 'externalId',
    allowed: 'one that is not stored yet for this athlete and source',
  },
  training_session_heart_rate_range: {
    kind: 'validation',
    field: 'meanHeartRateBpm',
    allowed: 'mean 25 to 240 bpm, peak 25 to 250 bpm',
  },
  training_session_intended_rating_range: { kind: 'validation', field: 'intendedRating', allowed: 'from 0 to 10' },
  training_session_kind_known: { kind: 'validation', field: 'kind', allowed: 'training, competition or test' },
  training_session_quality_known: { kind: 'validation', field: 'quality', allowed: 'ok, question or suspect' },
  training_session_rating_delay_range: { kind: 'validation', field: 'ratingDelayMin', allowed: 'from 0 to 20160 min' },
  training_session_rating_range: { kind: 'validation', field: 'rating', allowed: 'from 0 to 10' },
  training_session_withdrawn_why: { kind: 'validation', field: 'reason', allowed: 'required to withdraw a session' },

  session_revision_session_fk: { kind: 'not-found', field: 'sessionId', allowed: 'a session of the club' },
  session_weight_domain_load_when_present: {
    kind: 'rule',
    field: 'domainLoad',
    allowed: 'a value where it is present, none elsewhere',
  },
  session_weight_domain_state_known: {
    kind: 'rule',
    field: 'domainState',
    allowed: 'present, absent or not-applicable',
  },
  session_weight_minutes_not_negative: { kind: 'rule', field: 'weight', allowed: 'minutes and loads from 0 on' },
  session_weight_policy_fk: { kind: 'not-found', field: 'policyId', allowed: 'a policy of the club' },
  session_weight_session_fk: { kind: 'not-found', field: 'sessionId', allowed: 'a session of the club' },
  daily_total_athlete_fk: { kind: 'not-found', field: 'athleteId', allowed: 'an athlete of the club' },
  daily_total_not_negative: { kind: 'rule', field: 'dailyTotal', allowed: 'sums from 0 on' },
  reweigh_task_athlete_fk: { kind: 'not-found', field: 'athleteId', allowed: 'an athlete of the club' },

  day_closing_squad_fk: { kind: 'not-found', field: 'squadId', allowed: 'a squad of the club' },
  day_unknown_athlete_fk: { kind: 'not-found', field: 'unknownAthleteIds', allowed: 'athletes of the club' },
  day_unknown_closing_fk: { kind: 'conflict', field: 'day', allowed: 'a day that is closed' },

  availability_athlete_fk: { kind: 'not-found', field: 'athleteId', allowed: 'an athlete of the club' },
  availability_cause_known: {
    kind: 'validation',
    field: 'cause',
    allowed: 'illness, injury, complaint, away or other',
  },
  availability_no_overlap: {
    kind: 'conflict',
    field: 'from',
    allowed: 'days no other entry of the athlete has',
    hint: 'End it first.',
  },
  availability_order: { kind: 'validation', field: 'to', allowed: 'a date not before from' },
  availability_state_known: { kind: 'validation', field: 'state', allowed: 'full, modified or none' },

  load_period_athlete_fk: { kind: 'not-found', field: 'athleteId', allowed: 'an athlete of the club' },
  load_period_no_overlap: {
    kind: 'conflict',
    field: 'from',
    allowed: 'days no other period of the same squad or athlete has',
  },
  load_period_order: { kind: 'validation', field: 'to', allowed: 'a date not before from' },
  load_period_overload_length: { kind: 'rule', field: 'to', allowed: 'at most 21 days for an overload' },
  load_period_purpose_known: { kind: 'validation', field: 'purpose', allowed: 'overload, unload or taper' },
  load_period_squad_fk: { kind: 'not-found', field: 'squadId', allowed: 'a squad of the club' },

  morning_answer_athlete_fk: { kind: 'not-found', field: 'athleteId', allowed: 'an athlete of the club' },
  morning_answer_fatigue_range: { kind: 'validation', field: 'fatigue', allowed: 'a whole number from 1 to 7' },
  morning_answer_mood_range: { kind: 'validation', field: 'mood', allowed: 'a whole number from 1 to 7' },
  morning_answer_once: {
    kind: 'conflict',
    field: 'day',
    allowed: 'a day without a morning',
    hint: 'Add to it with PATCH.',
  },
  morning_answer_quality_known: { kind: 'rule', field: 'quality', allowed: 'ok, question or suspect' },
  morning_answer_resting_heart_rate_range: {
    kind: 'validation',
    field: 'restingHeartRateBpm',
    allowed: 'a number from 25 to 120 bpm',
  },
  morning_answer_rmssd_range: { kind: 'validation', field: 'rmssdMs', allowed: 'a number from 1 to 500 ms' },
  morning_answer_sleep_hours_range: {
    kind: 'validation',
    field: 'sleepHours',
    allowed: 'a number from 0 to 24 hours',
  },
  morning_answer_sleep_range: { kind: 'validation', field: 'sleep', allowed: 'a whole number from 1 to 7' },
  morning_answer_soreness_range: { kind: 'validation', field: 'soreness', allowed: 'a whole number from 1 to 7' },
  morning_answer_stress_range: { kind: 'validation', field: 'stress', allowed: 'a whole number from 1 to 7' },
  morning_answer_withdrawn_why: { kind: 'validation', field: 'reason', allowed: 'a reason with every withdrawal' },
  morning_revision_morning_fk: { kind: 'not-found', field: 'day', allowed: 'a morning of the club' },

  circumstance_athlete_fk: { kind: 'not-found', field: 'athleteId', allowed: 'an athlete of the club' },
  circumstance_kind_known: { kind: 'validation', field: 'kind', allowed: 'travel, heat or altitude' },
  circumstance_order: { kind: 'validation', field: 'to', allowed: 'a date not before the first day' },
  circumstance_squad_fk: { kind: 'not-found', field: 'squadId', allowed: 'a squad of the club' },
  circumstance_withdrawn_why: { kind: 'validation', field: 'reason', allowed: 'a reason with every withdrawal' },

  test_definition_direction_known: { kind: 'validation', field: 'direction', allowed: 'higher or lower' },
  test_definition_kind_known: { kind: 'validation', field: 'kind', allowed: 'criterion or standard-bout' },
  test_definition_name_once: { kind: 'conflict', field: 'name', allowed: 'a name no other test of the squad has' },
  test_definition_scale_by_kind: {
    kind: 'validation',
    field: 'kind',
    allowed:
      'unit, direction and typicalError for a criterion; typical errors of rating and heart rate for a standard-bout',
  },
  test_definition_squad_fk: { kind: 'not-found', field: 'squadId', allowed: 'a squad of the club' },
  test_definition_typical_error_range: { kind: 'validation', field: 'typicalError', allowed: 'a number above 0' },
  test_definition_withdrawn_why: { kind: 'validation', field: 'reason', allowed: 'a reason with every withdrawal' },
  test_result_athlete_fk: { kind: 'not-found', field: 'athleteId', allowed: 'an athlete of the club' },
  test_result_definition_fk: { kind: 'not-found', field: 'definitionId', allowed: 'a test of the club' },
  test_result_heart_rate_range: {
    kind: 'validation',
    field: 'heartRateBpm',
    allowed: 'a number from 60 to 240 bpm',
  },
  test_result_heart_rate_recovery_range: {
    kind: 'validation',
    field: 'heartRateRecoveryBpm',
    allowed: 'a number from 0 to 120 bpm',
  },
  test_result_lactate_range: { kind: 'validation', field: 'lactateMmolL', allowed: 'a number from 0.1 to 35 mmol/L' },
  test_result_once: { kind: 'conflict', field: 'day', allowed: 'a day without a result of this test' },
  test_result_quality_known: { kind: 'rule', field: 'quality', allowed: 'ok or suspect' },
  test_result_rating_range: { kind: 'validation', field: 'rating', allowed: 'a number from 0 to 10' },
  test_result_supersedes_fk: { kind: 'not-found', field: 'resultId', allowed: 'a result of the club' },
  test_result_value_range: { kind: 'validation', field: 'value', allowed: 'a number above 0, at most 1000000' },
  test_result_withdrawn_why: { kind: 'validation', field: 'reason', allowed: 'a reason with every withdrawal' },
  test_result_work_range: { kind: 'validation', field: 'workW', allowed: 'a number from 20 to 2000 W' },

  session_weight_basis_known: {
    kind: 'rule',
    field: 'basis',
    allowed: 'power, speed, interval, minutes, heart-rate or rating',
  },
  training_session_modality_known: { kind: 'validation', field: 'modality', allowed: 'a modality of the service' },
  training_session_setting_known: { kind: 'validation', field: 'setting', allowed: 'a setting of the service' },
  threshold_value_modality_known: { kind: 'validation', field: 'modality', allowed: 'a modality of the service' },
  threshold_value_setting_known: { kind: 'validation', field: 'setting', allowed: 'a setting of the service' },
  training_session_rating_by_known: { kind: 'validation', field: 'ratingBy', allowed: 'athlete or staff' },
  training_session_version_range: { kind: 'rule', field: 'version', allowed: 'from 1 on' },
  training_session_mean_below_peak: { kind: 'rule', field: 'meanHeartRateBpm', allowed: 'at most peakHeartRateBpm' },
  squad_name_length: { kind: 'validation', field: 'name', allowed: 'text of 1 to 200 characters' },
  reweigh_task_state_known: { kind: 'rule', field: 'state', allowed: 'waiting, running or done' },
  reweigh_task_counts_range: { kind: 'rule', field: 'total', allowed: 'counts from 0 on' },
  training_session_entered_by_fk: { kind: 'not-found', field: 'enteredBy', allowed: 'a person of the club' },
  session_revision_changed_by_fk: { kind: 'not-found', field: 'changedBy', allowed: 'a person of the club' },
  threshold_value_entered_by_fk: { kind: 'not-found', field: 'enteredBy', allowed: 'a person of the club' },
  threshold_value_withdrawn_by_fk: { kind: 'not-found', field: 'withdrawnBy', allowed: 'a person of the club' },
  day_closing_closed_by_fk: { kind: 'not-found', field: 'closedBy', allowed: 'a person of the club' },
  availability_entered_by_fk: { kind: 'not-found', field: 'enteredBy', allowed: 'a person of the club' },
  load_period_entered_by_fk: { kind: 'not-found', field: 'enteredBy', allowed: 'a person of the club' },
  load_policy_created_by_fk: { kind: 'not-found', field: 'createdBy', allowed: 'a person of the club' },
  report_made_by_fk: { kind: 'not-found', field: 'madeBy', allowed: 'a person of the club' },
  idempotency_key_person_id_fk: { kind: 'not-found', field: 'personId', allowed: 'a person of the club' },
  audit_entry_person_id_fk: { kind: 'not-found', field: 'personId', allowed: 'a person of the club' },
  morning_answer_entered_by_fk: { kind: 'not-found', field: 'enteredBy', allowed: 'a person of the club' },
  morning_revision_changed_by_fk: { kind: 'not-found', field: 'changedBy', allowed: 'a person of the club' },
  circumstance_entered_by_fk: { kind: 'not-found', field: 'enteredBy', allowed: 'a person of the club' },
  test_definition_created_by_fk: { kind: 'not-found', field: 'createdBy', allowed: 'a person of the club' },
  test_result_entered_by_fk: { kind: 'not-found', field: 'enteredBy', allowed: 'a person of the club' },
  test_result_withdrawn_by_fk: { kind: 'not-found', field: 'withdrawnBy', allowed: 'a person of the club' },
};
