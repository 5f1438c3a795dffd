import { DiscoveryService } from '@nestjs/core';
import type { INestApplication } from '@nestjs/common';
import { controllerRoutes } from '../../src/delivery/http/controller-routes.ts';
import type { ControllerRoute } from '../../src/delivery/http/controller-routes.ts';

/** Every route of every controller the application serves. */
export function routesOf(app: INestApplication): ControllerRoute[] {
  const controllers = app.get(DiscoveryService, { strict: false }).getControllers();
  return controllers.flatMap(({ metatype }) => (metatype === null ? [] : controllerRoutes(metatype)));
}

/** A path with every parameter filled in; the same value for all that are not named. */
export function filled(path: string, values: Readonly<Record<string, string>>, other: string): string {
  return path.replace(/:(\w+)/g, (_, name: string) => values[name] ?? other);
}
