import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { Link, useNavigate } from 'react-router-dom';
import { v7 as uuidv7 } from 'uuid';
import { SignUp } from '#shared/session.ts';
import { Block } from '#src/components/Block.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { Door, FormProblem } from '#src/features/session/Door.tsx';
import { MailIsOnItsWay } from '#src/features/session/MailIsOnItsWay.tsx';
import { PASSWORD_HINT } from '#src/features/session/password-hint.ts';
import { useSignIn, useSignUp } from '#src/features/session/session.queries.ts';
import { CallProblem } from '#src/lib/call.ts';
import { placeProblems } from '#src/lib/form-problem.ts';
import { paths } from '../paths.ts';

const deviceZone = Intl.DateTimeFormat().resolvedOptions().timeZone;

/** A new workshop with its owner. Whether the address is known shows only in the mail. */
export function Component() {
  const navigate = useNavigate();
  const signUp = useSignUp();
  const signIn = useSignIn();
  const [mailedTo, setMailedTo] = useState<string>();
  const [workshopId] = useState(() => uuidv7());
  const { register, handleSubmit, setError, formState: { errors } } = useForm({ resolver: zodResolver(SignUp), defaultValues: { workshopId, workshopName: '', name: '', email: '', password: '', timeZone: deviceZone } });
  const submit = handleSubmit(async (wish) => {
    try {
      await signUp.mutateAsync(wish);
      await signIn.mutateAsync({ email: wish.email, password: wish.password, workshopId: wish.workshopId });
      await navigate(paths.today, { replace: true });
    } catch (error) {
      if (error instanceof CallProblem && error.status === 401) return setMailedTo(wish.email);
      const left = placeProblems(error, setError, ['workshopName', 'name', 'email', 'password']);
      if (left) setError('root', { message: left });
    }
  });
  if (mailedTo !== undefined) return <Door heading="Look into your mail"><MailIsOnItsWay>A mail to {mailedTo} says how to go on.</MailIsOnItsWay></Door>;
  return (
    <Door heading="Start a workshop" says="You become its owner; the others join by your invitation.">
      <form className="grid gap-4" noValidate onSubmit={(event) => void submit(event)}>
        {errors.root && <FormProblem>{errors.root.message}</FormProblem>}
        <TextField label="Name of the workshop" autoComplete="organization" error={errors.workshopName?.message} {...register('workshopName')} />
        <TextField label="Your name" autoComplete="name" error={errors.name?.message} {...register('name')} />
        <TextField label="E-mail address" type="email" autoComplete="username" error={errors.email?.message} {...register('email')} />
        <TextField label="Password" type="password" autoComplete="new-password" hint={PASSWORD_HINT} error={errors.password?.message} {...register('password')} />
        <p className="text-note text-ink-2">Days are counted in the time zone {deviceZone}; it can be changed under Workshop.</p>
        <Block kind="main" size="bench" type="submit" busy={(signUp.isPending || signIn.isPending) && 'Making the workshop …'}>Start the workshop</Block>
        <p className="text-row"><Link to={paths.signIn} className="inline-block py-2.5 underline underline-offset-3">I have an account</Link></p>
      </form>
    </Door>
  );
}
