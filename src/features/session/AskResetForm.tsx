import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { Link } from 'react-router-dom';
import { AskReset } from '#shared/session.ts';
import { Block } from '#src/components/Block.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { placeProblems } from '#src/lib/form-problem.ts';
import { FormProblem } from './Door.tsx';
import { MailIsOnItsWay } from './MailIsOnItsWay.tsx';
import { useAskReset } from './session.queries.ts';

/** Asks for the mail; the answer is the same for every address. */
export function AskResetForm({ signIn }: { signIn: string }) {
  const ask = useAskReset();
  const { register, handleSubmit, setError, formState: { errors } } = useForm({ resolver: zodResolver(AskReset), defaultValues: { email: '' } });
  const submit = handleSubmit(async ({ email }) => {
    try {
      await ask.mutateAsync(email);
    } catch (error) {
      const left = placeProblems(error, setError, ['email']);
      if (left) setError('root', { message: left });
    }
  });
  if (ask.isSuccess) {
    return (
      <>
        <MailIsOnItsWay>If somebody has an account with the address {ask.variables}, a mail with a link is on its way. The link works once, for 30 minutes.</MailIsOnItsWay>
        <p className="text-row"><Link to={signIn} className="inline-block py-2.5 underline underline-offset-3">Back to sign in</Link></p>
      </>
    );
  }
  return (
    <form className="grid gap-4" noValidate onSubmit={(event) => void submit(event)}>
      {errors.root && <FormProblem>{errors.root.message}</FormProblem>}
      <TextField label="E-mail address" type="email" autoComplete="username" error={errors.email?.message} {...register('email')} />
      <Block kind="main" size="bench" type="submit" busy={ask.isPending && 'Asking …'}>Mail me a link</Block>
      <p className="text-row"><Link to={signIn} className="inline-block py-2.5 underline underline-offset-3">Back to sign in</Link></p>
    </form>
  );
}
