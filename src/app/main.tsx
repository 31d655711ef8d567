import '@fontsource-variable/roboto-flex/standard.css';
import '#src/lib/theme.css';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { RouterProvider } from 'react-router-dom';
import { makeQueryClient } from '#src/lib/query-client.ts';
import { applyRoom } from '#src/lib/room.ts';
import { Providers } from './providers.tsx';
import { makeRouter } from './router.tsx';

applyRoom();
const client = makeQueryClient();
const router = makeRouter(client);
const root = document.getElementById('root');
if (!root) throw new Error('The page has no #root');
createRoot(root).render(
  <StrictMode>
    <Providers client={client}>
      <RouterProvider router={router} />
    </Providers>
  </StrictMode>,
);
