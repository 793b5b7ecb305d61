import { QueryClientProvider } from '@tanstack/react-query';
import { Suspense, useState } from 'react';
import { RouterProvider } from 'react-router-dom';
import { LiveRegion } from '../components/LiveRegion';
import { ToastRegion } from '../components/ToastRegion';
import { Waiting } from '../components/Waiting';
import { makeQueryClient } from './queryClient';
import { router } from './router';

export function App() {
  const [queries] = useState(makeQueryClient);
  return (
    <QueryClientProvider client={queries}>
      <Suspense
        fallback={
          <div className="p-5">
            <Waiting label="The page is on its way" />
          </div>
        }
      >
        <RouterProvider router={router} />
      </Suspense>
      <ToastRegion />
      <LiveRegion />
    </QueryClientProvider>
  );
}
