export interface Squad {
  id: string;
  name: string;
  /** IANA zone in which the squad's training days begin and end. */
  zone: string;
}

export interface Member {
  athleteId: string;
  name: string;
}

/** A stay in a squad that touches the days asked for; both ends included, null = open. */
export interface MemberStay extends Member {
  from: string;
  to: string | null;
}

export interface SquadPerson {
  personId: string;
  name: string;
  email: string;
}
