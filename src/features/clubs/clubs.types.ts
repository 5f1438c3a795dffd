export interface Club {
  id: string;
  name: string;
  /** The key the operator made it with; the same key never makes a second club. */
  externalKey: string | null;
}
