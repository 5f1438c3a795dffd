import { Injectable } from '@nestjs/common';
import { z } from 'zod';
import { ReweighService } from '../src/features/sessions/reweigh.service.ts';

const taskData = z.object({ taskId: z.uuid() });

/** Weighs anew what a change of thresholds or policy touches; the task itself remembers how far it got. */
@Injectable()
export class ReweighJob {
  static readonly queue = 'reweigh';

  constructor(private readonly reweigh: ReweighService) {}

  async run(clubId: string, data: unknown): Promise<void> {
    await this.reweigh.processTask(clubId, taskData.parse(data).taskId);
  }
}
