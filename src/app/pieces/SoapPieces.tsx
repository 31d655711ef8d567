import type { FaultView } from '#shared/faults.ts';
import type { Palette } from '#shared/words/batch-words.ts';
import { FAMILY_OF, PATTERNS } from '#src/components/fault-glyphs.tsx';
import { FaultMark } from '#src/components/FaultMark.tsx';
import { Loaf } from '#src/components/Loaf.tsx';
import { LotTag } from '#src/components/LotTag.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { Slice } from '#src/components/Slice.tsx';

const FAMILIES: readonly (readonly [FaultView['family'], string])[] = [
  ['surface', 'Surface'], ['structure', 'Inside'], ['pour', 'Batter and pour'], ['colour', 'Colour'], ['scent', 'Scent'], ['safety', 'Safety'],
];

const SOAPS: readonly Palette[] = [
  { base: '#cdb3a4', second: '#7d3340', third: '#e8ddd4', design: 'swirl' }, { base: '#d9d8cf', second: '#4f6f91', third: '#eeeeea', design: 'layers' },
  { base: '#b98a6b', second: '#6b3f2a', third: '#d8bba7', design: 'specks' }, { base: '#e9dcc8', second: '#d8cfb2', third: '#f3eede', design: 'plain' },
];

const wordsOf = (slug: string) => slug.charAt(0).toUpperCase() + slug.slice(1).replaceAll('-', ' ');

/** Every fault's mark by family; a batch's face and loaf; a lot's tag. */
export function SoapPieces() {
  return (
    <>
      <section>
        <Rail heading="Fault marks" aside="outline: family. Pattern: fault" />
        <dl>
          {FAMILIES.map(([family, name]) => (
            <div key={family} className="grid gap-x-4 gap-y-2 border-b border-line py-3 rack:grid-cols-[7rem_1fr]">
              <dt className="font-[640]">{name}</dt>
              <dd className="flex flex-wrap gap-x-5 gap-y-2 text-row">
                {Object.keys(PATTERNS).filter((slug) => FAMILY_OF[slug] === family).map((slug) => <FaultMark key={slug} fault={slug} name={wordsOf(slug)} size={24} withName />)}
              </dd>
            </div>
          ))}
          <div className="grid gap-x-4 gap-y-2 py-3 rack:grid-cols-[7rem_1fr]">
            <dt className="font-[640]">A workshop’s own</dt>
            <dd className="flex flex-wrap items-center gap-x-5 gap-y-2 text-row">
              <FaultMark fault="own-crumbling-corner" name="Crumbling corner" size={24} withName />
              {([1, 2, 3] as const).map((severity) => <FaultMark key={severity} fault="soda-ash" name="Soda ash" size={28} severity={severity} withName />)}
            </dd>
          </div>
        </dl>
      </section>
      <section className="grid content-start gap-4">
        <Rail heading="Slice, loaf and tag" aside="a batch is known by its cut face" />
        <div className="flex flex-wrap gap-3">{SOAPS.map((soap) => <Slice key={soap.base} soap={soap} width={40} height={46} />)}<Slice soap={null} width={40} height={46} /></div>
        <div className="flex flex-wrap items-end gap-5">{SOAPS.map((soap, index) => <Loaf key={soap.base} soap={soap} bars={12 - index * 2} isCut={index > 0} hasAsh={index === 2} />)}</div>
        <div className="flex flex-wrap items-center gap-3">
          <LotTag code="EF-7802" /><LotTag code="EF-7803" standing="hot-process-only" /><LotTag code="GR-4120" standing="on-hold" /><LotTag code="CS-0998" standing="returned" /><LotTag code="EF-7802" isLarge />
        </div>
      </section>
    </>
  );
}
