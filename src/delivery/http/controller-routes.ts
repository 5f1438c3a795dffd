import { RequestMethod } from '@nestjs/common';
import { METHOD_METADATA, PATH_METADATA, ROUTE_ARGS_METADATA } from '@nestjs/common/constants.js';
import { RouteParamtypes } from '@nestjs/common/enums/route-paramtypes.enum.js';
import { z } from 'zod';
import { ACCESS_RULE } from './access.decorator.ts';
import type { AccessRule } from './access.decorator.ts';

const checked: Readonly<Record<string, string>> = {
  [RouteParamtypes.BODY]: 'Body',
  [RouteParamtypes.QUERY]: 'Query',
  [RouteParamtypes.PARAM]: 'Param',
};

export interface ControllerRoute {
  /** Class and method, for messages. */
  name: string;
  method: string;
  path: string;
  /** Undefined: none was given; null: public. */
  rule: AccessRule | null | undefined;
  /** Arguments taken from the request that no zod schema checks. */
  unchecked: string[];
}

/** The routes a controller class declares. */
export function controllerRoutes(controller: { name: string; prototype: object } | object): ControllerRoute[] {
  const type = controller as { name: string; prototype: object };
  const prefixes = [Reflect.getMetadata(PATH_METADATA, type) as string | string[] | undefined].flat();
  return Object.getOwnPropertyNames(type.prototype).flatMap((key) => {
    const handler = Object.getOwnPropertyDescriptor(type.prototype, key)?.value as unknown;
    if (typeof handler !== 'function') return [];
    const method = Reflect.getMetadata(METHOD_METADATA, handler) as RequestMethod | undefined;
    if (method === undefined) return [];
    const paths = [Reflect.getMetadata(PATH_METADATA, handler) as string | string[]].flat();
    const rule = Reflect.getMetadata(ACCESS_RULE, handler) as AccessRule | null | undefined;
    const common = {
      name: `${type.name}.${key}`,
      method: RequestMethod[method],
      rule,
      unchecked: unchecked(type, key),
    };
    return prefixes.flatMap((prefix) => paths.map((path) => ({ ...common, path: joined(prefix ?? '', path) })));
  });
}

interface ArgumentMark {
  data?: unknown;
  schema?: unknown;
}

function unchecked(type: object, key: string): string[] {
  const marks = (Reflect.getMetadata(ROUTE_ARGS_METADATA, type, key) ?? {}) as Record<string, ArgumentMark>;
  return Object.entries(marks).flatMap(([name, mark]) => {
    const kind = checked[name.split(':', 1)[0]!];
    return kind === undefined || mark.schema instanceof z.ZodType ? [] : [kind];
  });
}

function joined(...parts: string[]): string {
  return `/${parts
    .flatMap((part) => part.split('/'))
    .filter(Boolean)
    .join('/')}`;
}
