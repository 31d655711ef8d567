import { Block } from '#src/components/Block.tsx';
import { Choice } from '#src/components/Choice.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { useToasts } from '#src/components/Toasts.tsx';
import { ROLE_WORDS } from '#src/lib/role-words.ts';
import { PasswordForm } from './PasswordForm.tsx';
import { SessionList } from './SessionList.tsx';
import { useSession, useSetPreferences, useSwitchWorkshop } from './session.queries.ts';

function Preferences() {
  const { account } = useSession();
  const set = useSetPreferences();
  const { tell } = useToasts();
  const { temperatureUnit, massUnit, singleKeys } = account;
  const keep = (change: Partial<typeof account>) => set.mutate({ temperatureUnit, massUnit, singleKeys, ...change }, { onError: () => tell('Not kept; try again') });
  return (
    <section className="grid gap-4">
      <Rail heading="Units and keys" aside="yours in every workshop" />
      <dl className="grid items-center gap-x-6 gap-y-3 rack:grid-cols-[12rem_auto] rack:justify-start">
        <dt className="font-[560]">Temperature</dt>
        <dd><Choice label="Temperature" value={temperatureUnit} options={[{ value: 'celsius', label: '°C' }, { value: 'fahrenheit', label: '°F' }]} onChange={(value) => keep({ temperatureUnit: value })} /></dd>
        <dt className="font-[560]">Mass</dt>
        <dd><Choice label="Mass" value={massUnit} options={[{ value: 'gram', label: 'grams' }, { value: 'ounce', label: 'ounces' }]} onChange={(value) => keep({ massUnit: value })} /></dd>
        <dt className="font-[560]">Single keys</dt>
        <dd><Choice label="Single keys" value={singleKeys ? 'on' : 'off'} options={[{ value: 'on', label: 'on' }, { value: 'off', label: 'off' }]} onChange={(value) => keep({ singleKeys: value === 'on' })} /></dd>
      </dl>
      <p className="max-w-prose text-note text-ink-2">Records are kept in grams and °C whatever is chosen here. Single keys such as j and k are listed under ?.</p>
    </section>
  );
}

function MyWorkshops() {
  const { workshop, workshops } = useSession();
  const change = useSwitchWorkshop();
  const { tell } = useToasts();
  if (workshops.length < 2) return null;
  return (
    <section>
      <Rail heading="My workshops" />
      <ul>
        {workshops.map(({ id, name, role }) => (
          <li key={id} className="flex min-h-12 items-center gap-3 border-b border-line">
            <span className="font-[600]">{name}</span>
            <span className="text-note text-ink-2">{ROLE_WORDS[role]}</span>
            <span className="ml-auto">{id === workshop.id ? <span className="text-note text-ink-2">you are here</span> : <Block busy={change.isPending && 'Going …'} onClick={() => change.mutate(id, { onError: ({ message }) => tell(message) })}>Go there</Block>}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}

/** What is one's own: units, keys, password, devices, workshops. */
export function MySettings() {
  return (
    <div className="grid items-start gap-8 bench:grid-cols-2">
      <div className="grid gap-8"><Preferences /><MyWorkshops /><SessionList /></div>
      <PasswordForm />
    </div>
  );
}
