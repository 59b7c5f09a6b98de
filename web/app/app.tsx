import { QueryClientProvider } from '@tanstack/react-query';
import { useState } from 'react';
import { RouterProvider } from 'react-router/dom';
import { Toaster } from '../ui/toaster.tsx';
import { makeQueryClient } from './query-client.ts';
import { makeRouter } from './router.tsx';

export function App() {
  const [{ queryClient, router }] = useState(() => {
    const queryClient = makeQueryClient();
    return { queryClient, router: makeRouter(queryClient) };
  });
  return (
    <QueryClientProvider client={queryClient}>
      <RouterProvider router={router} />
      <Toaster />
    </QueryClientProvider>
  );
}
