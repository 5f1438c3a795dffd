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
export const constraintMessages: Readonly<Record<string, ConstraintMessage>> = {};
