export const circumstanceKinds = ['travel', 'heat', 'altitude'] as const;
export type CircumstanceKind = (typeof circumstanceKinds)[number];

/** Days on which answers and heart rates are explained by something other than training; both days included. */
export interface Circumstance {
  id: string;
  squadId: string;
  /** Null: of the whole squad. */
  athleteId: string | null;
  kind: CircumstanceKind;
  from: string;
  to: string;
  note: string | null;
  enteredBy: string | null;
  enteredAt: Date;
  withdrawnAt: Date | null;
  withdrawReason: string | null;
}
