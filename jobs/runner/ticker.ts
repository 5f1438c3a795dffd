import { Inject, Injectable, Logger } from '@nestjs/common';
import type { BeforeApplicationShutdown, OnApplicationBootstrap } from '@nestjs/common';
import { SchedulerRegistry } from '@nestjs/schedule';
import { TickService } from './tick.service.ts';

export const TICK_SECONDS = Symbol('TICK_SECONDS');

/** Ticks at the start and then at fixed intervals; a tick still under way lets the next one go by. */
@Injectable()
export class Ticker implements OnApplicationBootstrap, BeforeApplicationShutdown {
  private readonly logger = new Logger(Ticker.name);
  private underWay: Promise<void> | undefined;

  constructor(
    private readonly ticks: TickService,
    private readonly registry: SchedulerRegistry,
    @Inject(TICK_SECONDS) private readonly seconds: number,
  ) {}

  onApplicationBootstrap(): void {
    this.registry.addInterval(
      Ticker.name,
      setInterval(() => this.tick(), this.seconds * 1000),
    );
    this.tick();
  }

  async beforeApplicationShutdown(): Promise<void> {
    if (this.registry.doesExist('interval', Ticker.name)) this.registry.deleteInterval(Ticker.name);
    await this.underWay;
  }

  private tick(): void {
    this.underWay ??= this.ticks
      .tick()
      .then(() => undefined)
      .catch((error: unknown) => this.logger.error({ err: error }, 'the tick failed'))
      .finally(() => (this.underWay = undefined));
  }
}
