import { useState } from 'react';
import { QueryClientProvider } from '@tanstack/react-query';
import { sessionKey } from '../features/access/index.ts';
import { createQueryClient } from './query-client.ts';
import { Router } from './router.tsx';

export function App() {
  const [client] = useState(() => {
    const made = createQueryClient(() => made.setQueryData(sessionKey, null));
    return made;
  });
  return (
    <QueryClientProvider client={client}>
      <Router />
    </QueryClientProvider>
  );
}
