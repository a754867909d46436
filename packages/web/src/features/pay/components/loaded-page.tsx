import type { ComponentProps, ReactNode } from 'react';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Loaded } from '../../../components/states.tsx';

type Query<T> = ComponentProps<typeof Loaded<T>>['query'];

/** A whole page of one query: until its data is there, the page's own head and rail hold the place. */
export function LoadedPage<T>({
  query,
  what,
  title,
  children,
}: {
  query: Query<T>;
  what: string;
  title: string;
  children: (data: T) => ReactNode;
}) {
  if (query.data !== undefined) return <>{children(query.data)}</>;
  return (
    <>
      <PageHead title={title} />
      <RailPage>
        <Loaded query={query} what={what}>
          {children}
        </Loaded>
      </RailPage>
    </>
  );
}
