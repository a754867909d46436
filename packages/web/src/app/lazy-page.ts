import { createElement, lazy, useState } from 'react';
import type { ComponentType, FunctionComponent } from 'react';

export type LazyPage<P> = FunctionComponent<P> & {
  /** Fetches it ahead, so that it is drawn at once: a page that is waited for shows 300 ms later, by React's own pace. */
  preload: () => Promise<unknown>;
};

/** A page or a part of one that is fetched when it is first shown, or ahead. */
export function lazyPage<P extends object>(load: () => Promise<ComponentType<P>>): LazyPage<P> {
  let ready: ComponentType<P> | null = null;
  const fetched = async () => {
    ready = await load();
    return { default: ready };
  };
  const Waited = lazy(fetched);
  function Page(props: P) {
    // Chosen once, so that what is on the screen keeps its state.
    const [Shown] = useState<ComponentType<P>>(() => ready ?? Waited);
    return createElement(Shown, props);
  }
  return Object.assign(Page, { preload: fetched });
}
