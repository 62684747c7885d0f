import { RequestMethod } from '@nestjs/common';
import { MetadataScanner, ModulesContainer } from '@nestjs/core';
import { NEEDS, type Needed } from '../src/auth/needs.js';
import type { TestShop } from './test-app.js';

export interface Handler {
  readonly method: string;
  readonly path: string;
  readonly needs: Needed | undefined;
  readonly name: string;
}

/** Every handler of every controller, with what it says it needs. */
export function handlersOf({ app }: TestShop): Handler[] {
  const scanner = new MetadataScanner();
  const found: Handler[] = [];
  for (const module of app.get(ModulesContainer).values()) {
    for (const { instance, metatype } of module.controllers.values()) {
      const base = Reflect.getMetadata('path', metatype as object) as string;
      for (const name of scanner.getAllMethodNames(Object.getPrototypeOf(instance) as object)) {
        const handler = (instance as Record<string, object>)[name]!;
        const path = Reflect.getMetadata('path', handler) as string | undefined;
        if (path === undefined) continue;
        const method = RequestMethod[Reflect.getMetadata('method', handler) as number]!.toLowerCase();
        found.push({ method, path: `/api/${base}/${path}`.replace(/\/+/g, '/').replace(/\/$/, ''), needs: Reflect.getMetadata(NEEDS, handler) as Needed | undefined, name: `${(metatype as { name: string }).name}.${name}` });
      }
    }
  }
  return found;
}
