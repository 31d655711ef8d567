import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { MemberDetails, MemberView } from '#shared/members.ts';
import { Block } from '#src/components/Block.tsx';
import { DataTable, type ListColumn } from '#src/components/DataTable.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { ErrorState, LoadingShape } from '#src/components/states.tsx';
import { useMay } from '#src/features/session/session.queries.ts';
import { formatCount } from '#src/lib/format.ts';
import { ROLE_SAYS, ROLE_WORDS } from '#src/lib/role-words.ts';
import { InviteDialog } from './InviteDialog.tsx';
import { MemberDialog } from './MemberDialog.tsx';
import { memberDetailsQuery, membersQuery } from './members.queries.ts';

type Row = MemberView & { email?: string | null };

function standing(member: Row): string {
  if (member.hasEnded) return 'has left';
  return member.hasAccount ? 'can sign in' : 'a name in the records; cannot sign in';
}

function columns(onOpen: ((row: Row) => void) | undefined): ListColumn<Row>[] {
  return [
    {
      id: 'name', header: 'Name',
      cell: ({ row: { original } }) => (onOpen
        ? <button type="button" className="min-h-10 text-left font-[600] underline underline-offset-3" onClick={() => onOpen(original)}>{original.name}</button>
        : <span className="font-[600]">{original.name}</span>),
    },
    { id: 'role', header: 'Role', cell: ({ row: { original } }) => ROLE_WORDS[original.role] },
    ...(onOpen ? [{ id: 'email', header: 'E-mail address', cell: ({ row: { original } }) => original.email ?? '' } satisfies ListColumn<Row>] : []),
    { id: 'standing', header: 'Standing', cell: ({ row: { original } }) => standing(original) },
  ];
}

/** Who is in the workshop; the owner invites, changes roles and ends memberships. */
export function People() {
  const isOwner = useMay()('member.manage');
  const names = useQuery({ ...membersQuery, enabled: !isOwner });
  const details = useQuery({ ...memberDetailsQuery, enabled: isOwner });
  const { data, error, refetch } = isOwner ? details : names;
  const [isInviting, setInviting] = useState(false);
  const [opened, setOpened] = useState<MemberDetails>();
  if (error && !data) return <ErrorState error={error} onRetry={() => void refetch()} />;
  if (!data) return <LoadingShape says="Reading who is in the workshop" />;
  const open = isOwner ? (row: Row) => setOpened({ ...row, email: row.email ?? null }) : undefined;
  return (
    <div className="grid gap-6">
      <section className="grid max-w-5xl gap-4">
        <Rail heading="People" aside={formatCount(data.filter(({ hasEnded }) => !hasEnded).length, 'person', 'people')} />
        {isOwner && <Block kind="main" className="justify-self-start" onClick={() => setInviting(true)}>Invite somebody</Block>}
        <DataTable<Row> label="People of the workshop" columns={columns(open)} rows={data} rowId={({ id }) => id} {...(open ? { onOpen: open } : {})} columnClass={{ email: 'max-rack:hidden', standing: 'max-rack:hidden' }} />
      </section>
      <section className="grid max-w-5xl gap-2.5">
        <Rail heading="What each role may do" level={3} />
        <dl className="grid grid-cols-[7rem_minmax(0,1fr)] gap-y-1.5">
          {(['owner', 'maker', 'inspector', 'viewer'] as const).map((role) => (
            <div key={role} className="contents"><dt className="font-[560]">{ROLE_WORDS[role]}</dt><dd className="text-ink-2">{ROLE_SAYS[role]}</dd></div>
          ))}
        </dl>
      </section>
      {isInviting && <InviteDialog onClose={() => setInviting(false)} />}
      {opened && <MemberDialog member={opened} onClose={() => setOpened(undefined)} />}
    </div>
  );
}
