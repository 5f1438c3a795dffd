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
};
