import { QueryClientProvider, type QueryClient } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { ToastProvider } from '#src/components/Toasts.tsx';
import { UploadsProvider } from '#src/features/photos/Uploads.tsx';

/** What every screen stands on. */
export function Providers({ client, children }: { client: QueryClient; children: ReactNode }) {
  return (
    <QueryClientProvider client={client}>
      <ToastProvider>
        <UploadsProvider>{children}</UploadsProvider>
      </ToastProvider>
    </QueryClientProvider>
  );
}
