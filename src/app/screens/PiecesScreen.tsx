import { ActPieces } from '../pieces/ActPieces.tsx';
import { EvidencePieces } from '../pieces/EvidencePieces.tsx';
import { FieldPieces } from '../pieces/FieldPieces.tsx';
import { SoapPieces } from '../pieces/SoapPieces.tsx';

const PAIR = 'grid gap-9 bench:grid-cols-2 *:min-w-0';

/** All pieces together, for whoever works on them; nothing here is a record. */
export function Component() {
  return (
    <div className="grid gap-9 *:min-w-0">
      <h1>Pieces</h1>
      <div className={PAIR}><SoapPieces /></div>
      <div className={PAIR}><EvidencePieces /></div>
      <div className={PAIR}><ActPieces /></div>
      <FieldPieces />
    </div>
  );
}
