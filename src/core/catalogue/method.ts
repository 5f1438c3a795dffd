/** One published method as a person can look it up and run it. */
export interface Method {
  readonly id: string;
  readonly name: string;
  /** File and exported function. */
  readonly from: string;
  readonly inputs: readonly MethodInput[];
  /** Unit of the result. */
  readonly unit: string;
  readonly source: string;
  readonly provenance: string;
  /** Ids of the published checks it is compared with. */
  readonly checkedAgainst: readonly string[];
  readonly run: (input: object) => unknown;
}

/** One named input. A list may hold null for an unknown value. */
export interface MethodInput {
  readonly name: string;
  readonly unit: string;
  readonly kind: InputKind;
  readonly optional?: boolean;
  /** Kind 'rows' and 'record': what each row or the record holds. */
  readonly fields?: Readonly<Record<string, FieldKind>>;
}

export type InputKind = 'number' | 'numbers' | 'table' | 'text' | 'rows' | 'record' | 'flexible';
export type FieldKind = 'number' | 'maybe-number' | 'state' | 'flag' | 'any';

/** How the methods name what is known of their source. */
export const PROVENANCE = {
  published: 'published',
  memory: 'published; constants: value from memory',
  derived: 'derived from published definitions',
  textbook: 'textbook',
  own: 'own convention',
  practice: 'common practice, no source',
  mixed: 'published limits; the rest own convention',
  form: 'published form; numbers own convention',
} as const;
