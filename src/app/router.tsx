import type { QueryClient } from '@tanstack/react-query';
import { createBrowserRouter, redirect, type LoaderFunctionArgs } from 'react-router-dom';
import { sessionQuery } from '#src/features/session/session.queries.ts';
import { CallProblem } from '#src/lib/call.ts';
import { paths } from './paths.ts';
import { ScreenError } from './ScreenError.tsx';
import { Shell } from './Shell.tsx';

/** Leads whoever is not signed in to the door, and back afterwards. */
function guard(client: QueryClient) {
  return async ({ request }: LoaderFunctionArgs) => {
    try {
      return await client.ensureQueryData(sessionQuery);
    } catch (error) {
      if (!(error instanceof CallProblem) || error.status !== 401) throw error;
      const { pathname, search } = new URL(request.url);
      throw redirect(pathname === '/' ? paths.signIn : `${paths.signIn}?back=${encodeURIComponent(pathname + search)}`);
    }
  };
}

/** Data routes, each screen in its own file. */
export function makeRouter(client: QueryClient) {
  return createBrowserRouter([
    {
      loader: guard(client),
      element: <Shell />,
      errorElement: <ScreenError />,
      HydrateFallback: () => null,
      children: [
        {
          errorElement: <ScreenError />,
          children: [
            { index: true, lazy: () => import('./screens/TodayScreen.tsx') },
            { path: paths.inspect, lazy: () => import('./screens/InspectScreen.tsx') },
            { path: '/inspect/:batchId', lazy: () => import('./screens/InspectBatchScreen.tsx') },
            { path: paths.batches, lazy: () => import('./screens/BatchesScreen.tsx') },
            { path: paths.newBatch(), lazy: () => import('./screens/BatchFormScreen.tsx') },
            { path: paths.batch(':batchId'), lazy: () => import('./screens/BatchScreen.tsx') },
            { path: paths.changeBatch(':batchId'), lazy: () => import('./screens/BatchFormScreen.tsx') },
            { path: paths.workshop, lazy: () => import('./screens/WorkshopScreen.tsx') },
            { path: paths.claims, lazy: () => import('./screens/ClaimsScreen.tsx') },
            { path: paths.claim(':claimId'), lazy: () => import('./screens/ClaimScreen.tsx') },
            { path: paths.imports, lazy: () => import('./screens/ImportsScreen.tsx') },
            { path: paths.import(':importId'), lazy: () => import('./screens/ImportScreen.tsx') },
            { path: paths.causes, lazy: () => import('./screens/CausesScreen.tsx') },
            { path: '/causes/:fault/:input', lazy: () => import('./screens/CauseScreen.tsx') },
            { path: paths.methods, lazy: () => import('./screens/MethodsScreen.tsx') },
            { path: paths.lots, lazy: () => import('./screens/LotsScreen.tsx') },
            { path: paths.lot(':lotId'), lazy: () => import('./screens/LotScreen.tsx') },
            { path: paths.pieces, lazy: () => import('./screens/PiecesScreen.tsx') },
          ],
        },
      ],
    },
    {
      errorElement: <ScreenError />,
      HydrateFallback: () => null,
      children: [
        { path: paths.signIn, lazy: () => import('./screens/SignInScreen.tsx') },
        { path: paths.signUp, lazy: () => import('./screens/SignUpScreen.tsx') },
        { path: paths.reset, lazy: () => import('./screens/ResetScreen.tsx') },
        { path: paths.invitation(':token'), lazy: () => import('./screens/InvitationScreen.tsx') },
      ],
    },
  ]);
}
