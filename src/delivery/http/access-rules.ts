import { Injectable } from '@nestjs/common';
import type { OnModuleInit } from '@nestjs/common';
import { DiscoveryService } from '@nestjs/core';
import { controllerRoutes } from './controller-routes.ts';

/** Refuses to start while a route has no access rule, or takes something that no schema checks. */
@Injectable()
export class AccessRules implements OnModuleInit {
  constructor(private readonly discovery: DiscoveryService) {}

  onModuleInit(): void {
    const controllers = this.discovery.getControllers().flatMap(({ metatype }) => metatype ?? []);
    const faults = controllers
      .flatMap(controllerRoutes)
      .flatMap(({ name, path, rule, unchecked }) => [
        ...(rule === undefined ? [`${name}: neither @Access nor @Public`] : []),
        ...unchecked.map((argument) => `${name}: @${argument} without a zod schema`),
        ...(rule && 'param' in rule.target && !path.split('/').includes(`:${rule.target.param}`)
          ? [`${name}: no parameter ${rule.target.param} in ${path}`]
          : []),
      ]);
    if (faults.length > 0) throw new Error(`Routes that may not be served:\n  ${faults.join('\n  ')}`);
  }
}
