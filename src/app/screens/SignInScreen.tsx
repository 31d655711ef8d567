import { zodResolver } from '@hookform/resolvers/zod';
import { useQuery } from '@tanstack/react-query';
import { useForm } from 'react-hook-form';
import { Link, useNavigate, useSearchParams } from 'react-router-dom';
import { SignIn } from '#shared/session.ts';
import { Block } from '#src/components/Block.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { demoAccountsQuery, useSignIn } from '#src/features/session/session.queries.ts';
import { placeProblems } from '#src/lib/form-problem.ts';
import { paths } from '../paths.ts';

const ROLE_WORDS = { owner: 'owner', maker: 'maker', inspector: 'inspector', viewer: 'reads only' } as const;

/** Only addresses of our own pages lead on; anything else leads to Today. */
function safeWay(back: string | null): string {
  return back !== null && back.startsWith('/') && !back.startsWith('//') ? back : paths.today;
}

/** The door. */
export function Component() {
  const [search] = useSearchParams();
  const navigate = useNavigate();
  const signIn = useSignIn();
  const demo = useQuery(demoAccountsQuery);
  const { register, handleSubmit, setError, setValue, formState: { errors } } = useForm({ resolver: zodResolver(SignIn), defaultValues: { email: '', password: '' } });
  const submit = handleSubmit(async (wish) => {
    try {
      await signIn.mutateAsync(wish);
      await navigate(safeWay(search.get('back')), { replace: true });
    } catch (error) {
      const left = placeProblems(error, setError, ['email', 'password']);
      if (left) setError('root', { message: left });
    }
  });
  return (
    <main className="mx-auto grid w-full max-w-md flex-1 content-center gap-6 px-5 py-10">
      <p className="flex items-center gap-2 text-gauge-s font-[660] [font-stretch:124%]">
        <svg width="30" height="22" viewBox="0 0 30 22" aria-hidden="true"><path d="M1 4h15v14H1zM18 4h3v14h-3zM24 8h5v14h-5z" fill="currentColor" /></svg>
        Loafmark
      </p>
      <h1>Sign in</h1>
      <form className="grid gap-4" noValidate onSubmit={(event) => void submit(event)}>
        {errors.root && <p role="alert" className="border-l-4 border-ink bg-tray px-3 py-2">{errors.root.message}</p>}
        <TextField label="E-mail address" type="email" autoComplete="username" error={errors.email?.message} {...register('email')} />
        <TextField label="Password" type="password" autoComplete="current-password" error={errors.password?.message} {...register('password')} />
        <Block kind="main" size="bench" type="submit" busy={signIn.isPending && 'Signing in …'}>Sign in</Block>
        <p className="flex justify-between text-row"><Link to={paths.reset}>Forgot the password</Link><Link to={paths.signUp}>New workshop</Link></p>
      </form>
      {demo.data && demo.data.accounts.length > 0 && (
        <section>
          <Rail heading="People of the demo" aside={`password ${demo.data.password}`} />
          <ul>
            {demo.data.accounts.map(({ email, name, role, workshop }) => (
              <li key={email} className="border-b border-line">
                <button type="button" className="grid min-h-12 w-full grid-cols-[1fr_auto] items-center gap-x-3 py-1.5 text-left" onClick={() => { setValue('email', email); setValue('password', demo.data.password); }}>
                  <span><b className="font-[600]">{name}</b><br /><span className="text-note text-ink-2">{email}</span></span>
                  <span className="text-right text-note text-ink-2">{ROLE_WORDS[role]}<br />{workshop}</span>
                </button>
              </li>
            ))}
          </ul>
        </section>
      )}
    </main>
  );
}
