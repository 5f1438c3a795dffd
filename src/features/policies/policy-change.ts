/** Sessions of one squad that were weighed anew, or the task that does it. */
export interface Reweighed {
  sessionIds: string[];
  task: { id: string; total: number } | null;
}

/**
 * Told when a new policy weighs sessions differently (port and DI token): sessions of the squad from that day on get
 * their weight again. Runs inside the unit of work of the change.
 */
export abstract class PolicyChangeListener {
  abstract policyChanged(squadId: string, from: string): Promise<Reweighed>;
}
