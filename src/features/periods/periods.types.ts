export const purposes = ['overload', 'unload', 'taper'] as const;
export type Purpose = (typeof purposes)[number];

/** Planned days of more or less load, of a squad or of one athlete; both days included. */
export interface LoadPeriod {
  id: string;
  squadId: string;
  /** Null: of the whole squad. */
  athleteId: string | null;
  purpose: Purpose;
  from: string;
  to: string;
  note: string | null;
  enteredBy: string | null;
  enteredAt: Date;
}
