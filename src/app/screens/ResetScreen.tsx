import { useSearchParams } from 'react-router-dom';
import { AskResetForm } from '#src/features/session/AskResetForm.tsx';
import { Door } from '#src/features/session/Door.tsx';
import { NewPasswordForm } from '#src/features/session/NewPasswordForm.tsx';
import { paths } from '../paths.ts';

/** Without a mailed link it asks for one; with it the new password is set. */
export function Component() {
  const token = useSearchParams()[0].get('token');
  return token === null ? (
    <Door heading="Forgotten password" says="Type your address; a link to set a new one comes by mail."><AskResetForm signIn={paths.signIn} /></Door>
  ) : (
    <Door heading="Set a new password" says="You are then signed out everywhere, and sign in with the new one."><NewPasswordForm token={token} signIn={paths.signIn} ask={paths.reset} /></Door>
  );
}
