import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { sessionQuery } from '#src/features/session/session.queries.ts';
import { signedOut } from '#src/lib/signed-out.ts';
import { paths } from './paths.ts';

/**
 * A session that ended while somebody works: the page stays with all that was typed, signing in
 * happens beside it, and on the way back the notice goes by itself.
 */
export function SignedOutNotice() {
  const client = useQueryClient();
  const [isShown, setShown] = useState(false);
  useEffect(() => {
    // At the door a refusal only means a wrong password.
    const show = () => client.getQueryData(sessionQuery.queryKey) && setShown(true);
    signedOut.addEventListener('refused', show);
    return () => signedOut.removeEventListener('refused', show);
  }, [client]);
  useEffect(() => {
    if (!isShown) return undefined;
    const look = () => void client.fetchQuery({ ...sessionQuery, staleTime: 0 }).then(() => {
      setShown(false);
      return client.invalidateQueries();
    }, () => undefined);
    window.addEventListener('focus', look);
    return () => window.removeEventListener('focus', look);
  }, [client, isShown]);
  if (!isShown) return null;
  return (
    <div role="alert" className="no-print fixed inset-x-0 bottom-18 z-30 mx-auto flex w-fit max-w-[calc(100vw-2rem)] flex-wrap items-center gap-x-4 rounded-bar bg-ink px-4 py-1 text-on-ink rack:bottom-4">
      <span className="py-2">You are signed out. What you typed stays here.</span>
      <a href={paths.signIn} target="_blank" rel="noopener" className="flex min-h-11 items-center font-[600] underline underline-offset-3">Sign in, in a new tab</a>
    </div>
  );
}
