/** What a bench found, within one run on one machine. */
export interface BenchResult {
  name: string;
  value: number;
  /** Above this it is too slow. */
  limit: number;
  unit: string;
  ok: boolean;
  /** What was measured, in words. */
  note: string;
}

export interface Bench {
  name: string;
  description: string;
  run(log: (line: string) => void): Promise<BenchResult>;
}
