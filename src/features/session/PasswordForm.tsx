import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { ChangePassword } from '#shared/session.ts';
import { Block } from '#src/components/Block.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { useToasts } from '#src/components/Toasts.tsx';
import { placeProblems } from '#src/lib/form-problem.ts';
import { FormProblem } from './Door.tsx';
import { PASSWORD_HINT } from './password-hint.ts';
import { useChangePassword, useSession } from './session.queries.ts';

/** Changes one's own password; every other device is signed out. */
export function PasswordForm() {
  const { account } = useSession();
  const change = useChangePassword();
  const { tell } = useToasts();
  const { register, handleSubmit, setError, reset, formState: { errors } } = useForm({ resolver: zodResolver(ChangePassword), defaultValues: { current: '', password: '' } });
  const submit = handleSubmit(async (wish) => {
    try {
      await change.mutateAsync(wish);
      reset();
      tell('The new password is set; your other devices are signed out');
    } catch (error) {
      const left = placeProblems(error, setError, ['current', 'password']);
      if (left) setError('root', { message: left });
    }
  });
  return (
    <section className="grid gap-4">
      <Rail heading="Password" aside={account.email} />
      <form className="grid max-w-md gap-4" noValidate onSubmit={(event) => void submit(event)}>
        {errors.root && <FormProblem>{errors.root.message}</FormProblem>}
        <input type="hidden" autoComplete="username" value={account.email} readOnly />
        <TextField label="Current password" type="password" autoComplete="current-password" error={errors.current?.message} {...register('current')} />
        <TextField label="New password" type="password" autoComplete="new-password" hint={PASSWORD_HINT} error={errors.password?.message} {...register('password')} />
        <Block kind="main" type="submit" className="justify-self-start" busy={change.isPending && 'Setting …'}>Set the new password</Block>
      </form>
    </section>
  );
}
