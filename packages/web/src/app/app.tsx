import { useState } from 'react';
import { QueryClientProvider } from '@tanstack/react-query';
import { RouterProvider } from 'react-router';
import { sessionKey } from '../features/access/index.ts';
import { createQueryClient } from './query-client.ts';
import { createRouter } from './router.tsx';

export function App() {
  const [router] = useState(createRouter);
  const [client] = useState(() => {
    const made = createQueryClient(() => made.setQueryData(sessionKey, null));
    return made;
  });
  return (
    <QueryClientProvider client={client}>
      <RouterProvider router={router} />
    </QueryClientProvider>
  );
}
