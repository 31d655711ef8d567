import { Button, Menu, MenuItem, MenuTrigger, Popover } from 'react-aria-components';
import { useNavigate } from 'react-router-dom';
import { useSession, useSignOut } from '#src/features/session/session.queries.ts';
import { paths } from './paths.ts';

const ITEM = 'flex min-h-11 cursor-pointer items-center px-4 outline-none data-focused:bg-ink data-focused:text-on-ink';

/** Who is signed in, and the way out. */
export function PersonMenu({ onKeys }: { onKeys: () => void }) {
  const { member, workshop } = useSession();
  const navigate = useNavigate();
  const signOut = useSignOut();
  return (
    <MenuTrigger>
      <Button className="min-h-11 cursor-pointer px-2 text-row font-[560]" aria-label={`${member.name}, ${member.role} of ${workshop.name}`}>{member.name.split(' ')[0]}</Button>
      <Popover placement="bottom end" className="min-w-56 border border-line-firm bg-lift py-1 text-ink">
        <div className="border-b border-line px-4 py-2 text-note text-ink-2">{member.name}, {member.role}<br />{workshop.name}</div>
        <Menu
          className="outline-none"
          onAction={(key) => {
            if (key === 'settings') void navigate(`${paths.workshop}?tab=me`);
            if (key === 'keys') onKeys();
            if (key === 'out') signOut.mutate(undefined, { onSettled: () => void navigate(paths.signIn) });
          }}
        >
          <MenuItem id="settings" className={ITEM}>My settings</MenuItem>
          <MenuItem id="keys" className={ITEM}>Keys</MenuItem>
          <MenuItem id="out" className={ITEM}>Sign out</MenuItem>
        </Menu>
      </Popover>
    </MenuTrigger>
  );
}
