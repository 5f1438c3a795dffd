import type { CriterionEvidence } from '../response-signs/criterion-evidence.ts';
import type { CriterionResult, FamilyDay, SignFamily, StandardBout } from '../response-signs/types.ts';
import type { StandingFamily } from './standing-families.ts';

/** What the screen looks at; a family has one state a day, or is left out where it is not measured. */
export interface OverreachingInput {
  /** `explained`: illness, return, travel, heat or altitude is on record. */
  readonly days: readonly { readonly day: number; readonly explained: boolean }[];
  readonly families: Readonly<Partial<Record<SignFamily, readonly FamilyDay[]>>>;
  readonly results: readonly CriterionResult[];
  readonly bouts: readonly StandardBout[];
}

/** 'strained': signs of several families; 'overreaching-suspected': also performance that has fallen. */
export type OverreachingLevel = 'strained' | 'overreaching-suspected';

/** What it rests on: the last day it held, the families with their signs, and at the higher level the fallen performance. */
export interface OverreachingEvidence {
  readonly day: number;
  readonly families: readonly StandingFamily[];
  readonly criterion: CriterionEvidence | null;
}

/** A change of level. */
export interface OverreachingStep {
  readonly day: number;
  readonly change: 'raised' | 'escalated' | 'eased' | 'cleared';
  /** From that day on; null when cleared. */
  readonly level: OverreachingLevel | null;
}

/** A stretch of days on which an athlete was strained or worse. */
export interface OverreachingEpisode {
  readonly since: number;
  /** The first day on which it no longer stood; null while it stands. */
  readonly until: number | null;
  /** On the episode's last day. */
  readonly level: OverreachingLevel;
  readonly highest: OverreachingLevel;
  readonly steps: readonly OverreachingStep[];
  readonly evidence: OverreachingEvidence;
}
