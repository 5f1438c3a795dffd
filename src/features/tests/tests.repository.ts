import type { TestDefinition, TestResult } from './tests.types.ts';

/** Test definitions and results (port and DI token). */
export abstract class TestsRepository {
  abstract insertDefinition(definition: TestDefinition): Promise<void>;
  /** Of the squad, those that were not withdrawn, by name. */
  abstract definitions(squadId: string): Promise<TestDefinition[]>;
  /** Withdrawn ones too: results name them. */
  abstract definitionsById(ids: readonly string[]): Promise<TestDefinition[]>;
  /** False when it was withdrawn before. */
  abstract withdrawDefinition(id: string, reason: string, at: Date): Promise<boolean>;
  abstract insertResult(result: TestResult): Promise<void>;
  /** Those that were not withdrawn, by athlete and day. */
  abstract results(athleteIds: readonly string[]): Promise<TestResult[]>;
  /** False when it was withdrawn before. */
  abstract withdrawResult(id: string, by: string | null, reason: string, at: Date): Promise<boolean>;
}
