import { Grade, GRADE_SETTING, type GradeCode } from '#src/components/Grade.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { Strip, type Piece } from '#src/components/Strip.tsx';
import { Wire } from '#src/components/Wire.tsx';

const SENTENCES: readonly (readonly [GradeCode, string, number | null, number | null, number | null])[] = [
  ['shown-by-trial', 'Lot EF-7802 causes acceleration', 9, 3, 30], ['settled', 'More water goes with soda ash', 3.1, 2, 4.9],
  ['likely', 'Hot process goes with air pockets', 4.2, 1.4, 14], ['hint', 'A cover goes with less soda ash', 0.4, 0.14, 1.05],
  ['no-difference', 'New cutter wires and drag marks', 1.02, 0.82, 1.3], ['too-few', 'Arbour Rose GR-4120 and ricing, 1 of 3', 2, 0.1, 40],
  ['not-told-apart', 'Clove Stove and hot process', null, null, null],
];

const KINDS = [['clear', 'checked and clear'], ['not-checked', 'not looked at'], ['not-yet', 'cannot be seen yet'], ['safety', 'safety, held'], ['firsts', 'firsts'], ['seconds', 'seconds'], ['embeds', 'embeds'], ['rebatch', 'rebatch'], ['discarded', 'discarded'], ['kept', 'kept'], ['rack', 'on the rack']] as const;
const found = (severity: number): Piece => ({ kind: 'found', severity });
const STRIPS: readonly (readonly [string, readonly Piece[]])[] = [
  ['found, severity 1, 2, 3', [found(1), found(2), found(3)]],
  ...KINDS.map(([kind, label]) => [label, [{ kind }, { kind }]] as const),
];

/** How sure, and out of how many: grades, wires, strips. */
export function EvidencePieces() {
  return (
    <>
      <section>
        <Rail heading="How sure: the words set as the evidence does" />
        <ul>
          {SENTENCES.map(([grade, sentence, estimate, lower, upper]) => (
            <li key={grade} className="grid items-center gap-x-4 gap-y-1 border-b border-line py-2 rack:grid-cols-[12rem_5rem_1fr]">
              <Grade grade={grade} />
              <Wire grade={grade} estimate={estimate} lower={lower} upper={upper} raw={estimate === null ? null : estimate * 1.25} />
              <span className={`text-rail ${GRADE_SETTING[grade]}`}>{sentence}</span>
            </li>
          ))}
        </ul>
      </section>
      <section className="grid content-start gap-4">
        <Rail heading="The strip" aside="one piece, one thing counted" />
        <ul className="grid grid-cols-2 gap-x-4 gap-y-3 text-row desk:grid-cols-3">
          {STRIPS.map(([label, pieces]) => <li key={label} className="flex items-end gap-2.5"><Strip pieces={pieces} label={`A strip: ${label}`} width={13} height={20} /><span>{label}</span></li>)}
        </ul>
      </section>
    </>
  );
}
