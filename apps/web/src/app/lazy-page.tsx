import { type ComponentType, lazy, type ReactElement } from 'react';

/** A page that is fetched when its address is first opened: `lazyPage(async () => (await import('…')).KitPage)`. */
export function lazyPage(load: () => Promise<ComponentType>): ReactElement {
  const Page = lazy(async () => ({ default: await load() }));
  return <Page />;
}
