import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { ChangeMember, MemberDetails } from '#shared/members.ts';
import { Block } from '#src/components/Block.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { SelectField, TextField } from '#src/components/TextField.tsx';
import { useToasts } from '#src/components/Toasts.tsx';
import { CallProblem } from '#src/lib/call.ts';
import { placeProblems } from '#src/lib/form-problem.ts';
import { ROLE_OPTIONS, ROLE_WORDS } from '#src/lib/role-words.ts';
import { useChangeMember } from './members.queries.ts';

/** The record as it stands now, where somebody else was quicker. */
function currentOf(error: unknown): MemberDetails | undefined {
  if (!(error instanceof CallProblem) || error.status !== 412) return undefined;
  return MemberDetails.safeParse(error.problem.current).data;
}

/** Name and role of one member; ends the membership and takes it up again. */
export function MemberDialog({ member, onClose }: { member: MemberDetails; onClose: () => void }) {
  const change = useChangeMember();
  const { tell } = useToasts();
  const [version, setVersion] = useState(member.version);
  const { register, handleSubmit, setError, formState: { errors } } = useForm({ resolver: zodResolver(ChangeMember), defaultValues: { name: member.name, role: member.role } });
  const send = async (wish: ChangeMember) => {
    try {
      return await change.mutateAsync({ memberId: member.id, version, change: wish });
    } catch (error) {
      const current = currentOf(error);
      if (current) setVersion(current.version);
      const left = current
        ? `Somebody else changed this meanwhile: now ${current.name}, ${ROLE_WORDS[current.role]}${current.hasEnded ? ', has left' : ''}. Nothing was overwritten; press again to put yours in its place.`
        : placeProblems(error, setError, ['name', 'role']);
      if (left) setError('root', { message: left });
      return undefined;
    }
  };
  const keep = handleSubmit(async (wish) => {
    if (await send(wish)) onClose();
  });
  const setEnded = async (hasEnded: boolean) => {
    const now = await send({ hasEnded });
    if (!now) return;
    tell(hasEnded ? `${now.name} has left and is signed out` : `${now.name} is back`, () => change.mutate({ memberId: now.id, version: now.version, change: { hasEnded: !hasEnded } }));
    onClose();
  };
  return (
    <Dialog title={member.name} isOpen onClose={onClose}>
      <form className="grid gap-4" noValidate onSubmit={(event) => void keep(event)}>
        {errors.root && <p role="alert" className="border-l-4 border-ink bg-tray px-3 py-2">{errors.root.message}</p>}
        <TextField label="Name" autoComplete="off" hint={member.email ?? 'No account: a name in the records'} error={errors.name?.message} {...register('name')} />
        <SelectField label="Role" options={ROLE_OPTIONS} error={errors.role?.message} {...register('role')} />
        <Block kind="main" type="submit" busy={change.isPending && 'Keeping …'}>Keep</Block>
      </form>
      <div className="grid justify-items-start gap-2 border-t border-line pt-4">
        <p className="text-note text-ink-2">{member.hasEnded ? 'Has left. What was recorded under this name stays.' : 'Whoever leaves is signed out at once; what they recorded stays.'}</p>
        <Block kind="quiet" onClick={() => void setEnded(!member.hasEnded)}>{member.hasEnded ? 'Take the membership up again' : 'End the membership'}</Block>
      </div>
    </Dialog>
  );
}
