import { Global, Module } from '@nestjs/common';
import { PoliciesModule } from '../policies/policies.module.ts';
import { PolicyChangeListener } from '../policies/policy-change.ts';
import { ThresholdChangeListener } from '../thresholds/threshold-change.types.ts';
import { ThresholdsModule } from '../thresholds/thresholds.module.ts';
import { ReweighService } from './reweigh.service.ts';
import { WeigherService } from './weigher.service.ts';

/** Global, because those who tell it of changes are imported by it. */
@Global()
@Module({
  imports: [PoliciesModule, ThresholdsModule],
  providers: [
    WeigherService,
    ReweighService,
    { provide: PolicyChangeListener, useExisting: ReweighService },
    { provide: ThresholdChangeListener, useExisting: ReweighService },
  ],
  exports: [WeigherService, ReweighService, PolicyChangeListener, ThresholdChangeListener],
})
export class ReweighModule {}
