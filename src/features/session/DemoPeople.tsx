import type { DemoAccounts } from '#shared/session.ts';
import { ROLES } from '#shared/words/roles.ts';
import { Rail } from '#src/components/Rail.tsx';
import { ROLE_WORDS } from '#src/lib/role-words.ts';

/** People of the invented workshops as rows; one touch fills the form. */
export function DemoPeople({ demo, onChoose }: { demo: DemoAccounts; onChoose: (email: string) => void }) {
  const workshops = [...new Set(demo.accounts.map(({ workshop }) => workshop))];
  const byRole = [...demo.accounts].sort((a, b) => ROLES.indexOf(a.role) - ROLES.indexOf(b.role));
  return (
    <section className="grid gap-3" aria-label="Demo">
      <p className="text-note text-ink-2">Everything in the demo is invented. Touch a person to fill the form; the password is <b className="stamp text-ink">{demo.password}</b>.</p>
      {workshops.map((workshop) => (
        <div key={workshop}>
          <Rail heading={workshop} aside="demo workshop" />
          <ul>
            {byRole.filter((account) => account.workshop === workshop).map(({ email, name, role }) => (
              <li key={email} className="border-b border-line">
                <button type="button" className="flex min-h-10 w-full items-center gap-3 text-left hover:bg-tray coarse:min-h-12" onClick={() => onChoose(email)}>
                  <span className="font-[600]">{name}</span>
                  <span className="ml-auto text-row text-ink-2">{ROLE_WORDS[role]}</span>
                </button>
              </li>
            ))}
          </ul>
        </div>
      ))}
    </section>
  );
}
