export interface Athlete {
  id: string;
  name: string;
  sex: 'female' | 'male' | null;
  birthYear: number | null;
  personId: string | null;
}

/** A stay in one squad; both ends included, null = open. */
export interface Membership {
  id: string;
  athleteId: string;
  squadId: string;
  from: string;
  to: string | null;
}

/** Days an athlete lives in another zone than the squad, such as a camp. */
export interface ZonePeriod {
  id: string;
  athleteId: string;
  zone: string;
  from: string;
  to: string;
}
