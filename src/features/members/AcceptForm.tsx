import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { AcceptInvitation, type Invitation } from '#shared/members.ts';
import { Block } from '#src/components/Block.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { placeProblems } from '#src/lib/form-problem.ts';
import { useAcceptInvitation } from './members.queries.ts';

interface AcceptFormProps {
  token: string;
  invitation: Invitation;
  onJoined: (who: { email: string; password: string; workshopId: string }) => Promise<void>;
}

/** Takes up an invitation; somebody with an account shows that it is theirs. */
export function AcceptForm({ token, invitation, onJoined }: AcceptFormProps) {
  const accept = useAcceptInvitation();
  const { register, handleSubmit, setError, formState: { errors, isSubmitting } } = useForm({ resolver: zodResolver(AcceptInvitation), defaultValues: { token, name: invitation.name, password: '' } });
  const submit = handleSubmit(async (wish) => {
    try {
      const { workshopId } = await accept.mutateAsync(wish);
      await onJoined({ email: invitation.email, password: wish.password, workshopId });
    } catch (error) {
      const left = placeProblems(error, setError, ['name', 'password']);
      if (left) setError('root', { message: left });
    }
  });
  return (
    <form className="grid gap-4" noValidate onSubmit={(event) => void submit(event)}>
      {errors.root && <p role="alert" className="border-l-4 border-ink bg-tray px-3 py-2">{errors.root.message}</p>}
      <TextField label="E-mail address" type="email" autoComplete="username" value={invitation.email} readOnly />
      <TextField label="Your name" autoComplete="name" hint="As the others see it in this workshop" error={errors.name?.message} {...register('name')} />
      {invitation.hasAccount ? (
        <TextField label="Password" type="password" autoComplete="current-password" hint="You have an account with this address: type its password" error={errors.password?.message} {...register('password')} />
      ) : (
        <TextField label="Password" type="password" autoComplete="new-password" hint="At least 12 characters of any kind, for example four unrelated words" error={errors.password?.message} {...register('password')} />
      )}
      <Block kind="main" size="bench" type="submit" busy={isSubmitting && 'Joining …'}>Join</Block>
    </form>
  );
}
