import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { Link } from 'react-router-dom';
import { ResetPassword } from '#shared/session.ts';
import { Block, BlockLink } from '#src/components/Block.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { CallProblem } from '#src/lib/call.ts';
import { placeProblems } from '#src/lib/form-problem.ts';
import { FormProblem } from './Door.tsx';
import { PASSWORD_HINT } from './password-hint.ts';
import { useResetPassword } from './session.queries.ts';

/** Sets a new password by a mailed link. */
export function NewPasswordForm({ token, signIn, ask }: { token: string; signIn: string; ask: string }) {
  const reset = useResetPassword();
  const { register, handleSubmit, setError, formState: { errors } } = useForm({ resolver: zodResolver(ResetPassword), defaultValues: { token, password: '' } });
  const submit = handleSubmit(async (wish) => {
    try {
      await reset.mutateAsync(wish);
    } catch (error) {
      const isGone = error instanceof CallProblem && (error.status === 404 || error.problem.errors?.some(({ pointer }) => pointer === '#/token'));
      const left = isGone ? 'This link was used already, has run out or is not whole.' : placeProblems(error, setError, ['password']);
      if (left) setError('root', { message: left });
    }
  });
  if (reset.isSuccess) {
    return (
      <div role="status" className="grid justify-items-start gap-4">
        <p>The new password is set, and every earlier session of yours has ended.</p>
        <BlockLink kind="main" size="bench" to={signIn}>Sign in</BlockLink>
      </div>
    );
  }
  const problem = errors.root?.message ?? (errors.token && 'This link is not whole; copy it from the mail once more.');
  return (
    <form className="grid gap-4" noValidate onSubmit={(event) => void submit(event)}>
      {problem && <FormProblem>{problem} <Link to={ask} className="underline underline-offset-3">Ask for a new link</Link></FormProblem>}
      <TextField label="New password" type="password" autoComplete="new-password" hint={PASSWORD_HINT} error={errors.password?.message} {...register('password')} />
      <Block kind="main" size="bench" type="submit" busy={reset.isPending && 'Setting …'}>Set the password</Block>
    </form>
  );
}
