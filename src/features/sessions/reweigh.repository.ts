import type { ThresholdChange } from '../thresholds/thresholds.types.ts';
import type { Quality, StoredWeight, WeighedSession } from './sessions.types.ts';

/** Which sessions a change may touch. */
export type ReweighScope =
  | { kind: 'thresholds'; athleteId: string; changes: readonly ThresholdChange[] }
  | { kind: 'policy'; squadId: string; from: string };

export interface ReweighTask {
  id: string;
  /** Of a change of thresholds the athlete; of a squad's policy one of its athletes. */
  athleteId: string;
  scope: ReweighScope;
  total: number;
  done: number;
  touched: string[];
  /** The last session looked at. */
  cursor: string | null;
  state: 'waiting' | 'running' | 'done';
  createdAt: Date;
  finishedAt: Date | null;
}

/** Sessions to be weighed anew and the tasks that do it in batches (port and DI token). */
export abstract class ReweighRepository {
  abstract count(scope: ReweighScope): Promise<number>;

  /** Live sessions of the scope by id, from behind the cursor on. */
  abstract candidates(scope: ReweighScope, options: { after: string | null; limit: number }): Promise<WeighedSession[]>;

  /** Rewrites these weights and quality marks; everything else of a session stays. */
  abstract save(
    changed: readonly { sessionId: string; weight: StoredWeight; quality: Quality; qualityNotes: string[] }[],
  ): Promise<void>;

  /** The athletes of the scope, by id. */
  abstract athletes(scope: ReweighScope): Promise<string[]>;

  /** Nobody else works on the task until the unit of work ends. */
  abstract holdTask(id: string): Promise<void>;
  /** Answers the club it belongs to. */
  abstract insertTask(task: ReweighTask): Promise<string>;
  abstract task(id: string): Promise<ReweighTask | null>;
  abstract advance(
    id: string,
    progress: Pick<ReweighTask, 'done' | 'cursor' | 'state' | 'finishedAt'> & { touched: readonly string[] },
  ): Promise<void>;
}
