import { zodResolver } from '@hookform/resolvers/zod';
import { useQuery } from '@tanstack/react-query';
import { useForm } from 'react-hook-form';
import { Link, useNavigate, useSearchParams } from 'react-router-dom';
import { SignIn } from '#shared/session.ts';
import { Block } from '#src/components/Block.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { DemoPeople } from '#src/features/session/DemoPeople.tsx';
import { Door, FormProblem } from '#src/features/session/Door.tsx';
import { demoAccountsQuery, useSignIn } from '#src/features/session/session.queries.ts';
import { placeProblems } from '#src/lib/form-problem.ts';
import { safeWay } from '../back.ts';
import { paths } from '../paths.ts';

/** The door. */
export function Component() {
  const [search] = useSearchParams();
  const navigate = useNavigate();
  const signIn = useSignIn();
  const demo = useQuery(demoAccountsQuery).data;
  const { register, handleSubmit, setError, setValue, setFocus, clearErrors, formState: { errors } } = useForm({ resolver: zodResolver(SignIn), defaultValues: { email: search.get('email') ?? '', password: '' } });
  const back = search.get('back');
  const submit = handleSubmit(async (wish) => {
    try {
      await signIn.mutateAsync(wish);
      await navigate(safeWay(back), { replace: true });
    } catch (error) {
      const left = placeProblems(error, setError, ['email', 'password']);
      if (left) setError('root', { message: left });
    }
  });
  const fillIn = (email: string, password: string) => {
    setValue('email', email);
    setValue('password', password);
    clearErrors();
    setFocus('password');
  };
  return (
    <Door heading="Sign in" {...(back ? { says: 'Sign in to go on where you were.' } : {})}>
      <form className="grid gap-4" noValidate onSubmit={(event) => void submit(event)}>
        {errors.root && <FormProblem>{errors.root.message}</FormProblem>}
        <TextField label="E-mail address" type="email" autoComplete="username" error={errors.email?.message} {...register('email')} />
        <TextField label="Password" type="password" autoComplete="current-password" error={errors.password?.message} {...register('password')} />
        <Block kind="main" size="bench" type="submit" busy={signIn.isPending && 'Signing in …'}>Sign in</Block>
        <p className="flex flex-wrap gap-x-5 text-row">
          <Link to={paths.reset} className="py-2.5 underline underline-offset-3">Forgotten password</Link>
          <Link to={paths.signUp} className="py-2.5 underline underline-offset-3">Start a workshop</Link>
        </p>
      </form>
      {demo && demo.accounts.length > 0 && <DemoPeople demo={demo} onChoose={(email) => fillIn(email, demo.password)} />}
    </Door>
  );
}
