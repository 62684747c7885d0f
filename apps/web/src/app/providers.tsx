import { BlueprintProvider } from '@blueprintjs/core';
import { QueryClientProvider } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { ToasterProvider } from '../components/toaster.js';
import { queryClient } from './query-client.js';

export function Providers({ children }: { readonly children: ReactNode }) {
  return (
    <QueryClientProvider client={queryClient}>
      <BlueprintProvider>
        <ToasterProvider>{children}</ToasterProvider>
      </BlueprintProvider>
    </QueryClientProvider>
  );
}
