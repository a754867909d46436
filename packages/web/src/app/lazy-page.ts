import { lazy } from 'react';
import type { ComponentType, LazyExoticComponent } from 'react';

/** A page or a part of one that is fetched when it is first shown. */
export function lazyPage<P>(load: () => Promise<ComponentType<P>>): LazyExoticComponent<ComponentType<P>> {
  return lazy(async () => ({ default: await load() }));
}
