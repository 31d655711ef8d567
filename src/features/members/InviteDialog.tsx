import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { Invite } from '#shared/members.ts';
import { Block } from '#src/components/Block.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { SelectField, TextField } from '#src/components/TextField.tsx';
import { useToasts } from '#src/components/Toasts.tsx';
import { placeProblems } from '#src/lib/form-problem.ts';
import { ROLE_OPTIONS } from '#src/lib/role-words.ts';
import { useInvite } from './members.queries.ts';

/** Mails an invitation; a second one to the same address replaces the first. */
export function InviteDialog({ onClose }: { onClose: () => void }) {
  const invite = useInvite();
  const { tell } = useToasts();
  const { register, handleSubmit, setError, formState: { errors } } = useForm({ resolver: zodResolver(Invite), defaultValues: { name: '', email: '', role: 'maker' as const } });
  const submit = handleSubmit(async (wish) => {
    try {
      await invite.mutateAsync(wish);
      tell(`An invitation goes to ${wish.email}`);
      onClose();
    } catch (error) {
      const left = placeProblems(error, setError, ['name', 'email', 'role']);
      if (left) setError('root', { message: left });
    }
  });
  return (
    <Dialog title="Invite somebody" isOpen onClose={onClose}>
      <form className="grid gap-4" noValidate onSubmit={(event) => void submit(event)}>
        {errors.root && <p role="alert" className="border-l-4 border-ink bg-tray px-3 py-2">{errors.root.message}</p>}
        <TextField label="Name" autoComplete="off" error={errors.name?.message} {...register('name')} />
        <TextField label="E-mail address" type="email" autoComplete="off" error={errors.email?.message} {...register('email')} />
        <SelectField label="Role" options={ROLE_OPTIONS} error={errors.role?.message} {...register('role')} />
        <p className="text-note text-ink-2">The link in the mail works once, for 7 days.</p>
        <Block kind="main" type="submit" busy={invite.isPending && 'Inviting …'}>Mail the invitation</Block>
      </form>
    </Dialog>
  );
}
