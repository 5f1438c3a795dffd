import { Injectable } from '@nestjs/common';
import { FlagsService } from '../src/features/flags/flags.service.ts';
import type { JobKey } from '../src/features/jobs/jobs.types.ts';
import type { JobHandler, JobRun } from './runner/job-handler.ts';

/** Brings a squad's flags up to the day that ended: what was closed or corrected since is judged again. */
@Injectable()
export class NightlyFlagsJob implements JobHandler {
  readonly id = 'nightly-flags';

  constructor(private readonly flags: FlagsService) {}

  async run({ squadId, period, step }: JobRun): Promise<string> {
    const { asOf, written } = await step(() => this.flags.evaluateSquad(squadId, period));
    return asOf === null ? 'No day is closed yet.' : `Flags as of ${asOf}: ${written} written.`;
  }

  async preview({ squadId, period }: JobKey): Promise<string[]> {
    return [`The flags of squad ${squadId} would be brought up to the last closed day not after ${period}.`];
  }
}
