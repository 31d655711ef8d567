import { useQuery } from '@tanstack/react-query';
import { Link, useNavigate, useParams } from 'react-router-dom';
import { ErrorState, LoadingShape } from '#src/components/states.tsx';
import { AcceptForm } from '#src/features/members/AcceptForm.tsx';
import { invitationQuery } from '#src/features/members/members.queries.ts';
import { Door } from '#src/features/session/Door.tsx';
import { useSignIn } from '#src/features/session/session.queries.ts';
import { CallProblem } from '#src/lib/call.ts';
import { ROLE_SAYS, ROLE_WORDS } from '#src/lib/role-words.ts';
import { paths } from '../paths.ts';

/** Joining a workshop by a mailed link. */
export function Component() {
  const { token = '' } = useParams();
  const navigate = useNavigate();
  const signIn = useSignIn();
  const invitation = useQuery(invitationQuery(token));
  if (invitation.isPending) return <Door heading="Invitation"><LoadingShape says="Reading the invitation" rows={3} rowClassName="h-12" /></Door>;
  if (invitation.isError) {
    const isGone = invitation.error instanceof CallProblem && invitation.error.status < 500 && invitation.error.status !== 429;
    return (
      <Door heading="Invitation">
        {isGone ? (
          <p className="border-l-4 border-ink bg-tray px-3 py-2">This invitation was used already, has run out or is not whole. Ask whoever invited you for a new one, or <Link to={paths.signIn} className="underline underline-offset-3">sign in</Link>.</p>
        ) : (
          <ErrorState error={invitation.error} onRetry={() => void invitation.refetch()} />
        )}
      </Door>
    );
  }
  const { workshopName, role } = invitation.data;
  return (
    <Door heading={`Join ${workshopName}`} says={`You are invited as ${ROLE_WORDS[role] === 'reads only' ? 'somebody who reads only' : ROLE_WORDS[role]}. ${ROLE_SAYS[role]}.`}>
      <AcceptForm
        token={token}
        invitation={invitation.data}
        onJoined={async (who) => {
          await signIn.mutateAsync(who);
          await navigate(paths.today, { replace: true });
        }}
      />
    </Door>
  );
}
