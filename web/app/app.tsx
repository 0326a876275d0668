import { QueryClientProvider } from '@tanstack/react-query';
import { useEffect, useMemo } from 'react';
import { RouterProvider } from 'react-router-dom';
import { Announcer } from '../components/ui/announcer';
import { queryClient } from '../lib/client';
import { reportFault } from '../lib/problem';
import { listenForShortcuts } from '../lib/shortcuts';
import { createRouter } from './router';

export function App() {
  const router = useMemo(() => createRouter(), []);
  useEffect(() => listenForShortcuts(document), []);
  return (
    <QueryClientProvider client={queryClient}>
      <RouterProvider router={router} onError={reportFault} />
      <Announcer />
    </QueryClientProvider>
  );
}
