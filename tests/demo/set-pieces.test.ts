import { describe, expect, it } from 'vitest';
import { saltmarshKettle } from '#server/demo/history/saltmarsh.ts';
import { kohDemandG, naohForG, superfatFraction } from '#server/demo/history/weighing.ts';
import { demoDay, isCold, quernby, story, withLot } from './history-support.ts';

const byCode = (code: string) => {
  const batch = quernby.batches.find((b) => b.code === code);
  if (!batch) throw new Error(`no ${code}`);
  return batch;
};
const massOf = (code: string, material: string) => byCode(code).inputs.ingredients.find((line) => line.material === material)?.massG ?? 0;

describe('set pieces of the story', () => {
  it('stops QL-0147 at minus 1.457 per cent and mends it with 73.57 g of olive', () => {
    const card = [['olive', 400], ['coconut', 270], ['shea', 150], ['sunflower', 100], ['castor', 80]].map(([material, massG]) => ({ material: String(material), massG: Number(massG) }));
    expect(naohForG(kohDemandG(card), 0.05)).toBeCloseTo(141.39, 2);
    expect(superfatFraction(kohDemandG(card), 151)).toBeCloseTo(-0.01457, 4);
    expect([massOf('QL-0147', 'naoh'), massOf('QL-0147', 'olive')]).toEqual([151, 473.57]);
    expect(byCode('QL-0147').inputs.superfatWeighedFraction).toBeCloseTo(0.05, 4);
    expect(byCode('QL-0147').note).toContain('Ilse decided');
  });

  it('lets QL-0093 look right on paper and fail at the cut, and rebatches it', () => {
    const batch = byCode('QL-0093');
    expect(batch.inputs.superfatWeighedFraction).toBeCloseTo(0.05, 3);
    const without = batch.inputs.ingredients.filter((line) => line.material !== 'castor');
    expect(superfatFraction(kohDemandG(without), 141.39)).toBeCloseTo(-0.022, 3);
    expect(batch.inspections.find((l) => l.stage === 'cut')?.findings.map((f) => f.fault)).toContain('lye-heavy');
    const rebatch = story.filter((b) => b.holdsBarsOf.includes('QL-0093'));
    expect(rebatch.map((b) => [b.inputs.method, b.week])).toEqual([['rebatch', 66]]);
  });

  it('makes four rebatches, each of a batch that was there before it', () => {
    const rebatches = story.filter((b) => b.inputs.method === 'rebatch');
    expect(rebatches.map((b) => b.week)).toEqual([20, 41, 66, 90]);
    const sources = rebatches.map((b) => byCode(b.holdsBarsOf[0] ?? ''));
    expect([0, 2, 3].map((n) => sources[n]?.inputs.formula)).toEqual(['high-olive', 'everyday', 'milk-and-oat']);
    expect(sources[1]?.inputs.fragranceLot).toBe('EF-7802');
    rebatches.forEach((b, n) => expect((sources[n]?.madeOn ?? '') < b.madeOn).toBe(true));
  });

  it('hides the bad lot in the embeds of one of five Charcoal batches', () => {
    const hosts = story.filter((b) => b.inputs.hasEmbeds);
    expect(hosts).toHaveLength(5);
    expect(hosts.every((b) => b.inputs.formula === 'charcoal')).toBe(true);
    const donors = hosts.map((b) => byCode(b.holdsBarsOf[0] ?? ''));
    expect(donors.every((d) => d.inputs.formula === 'everyday' && d.dispositions.some((row) => row.kind === 'embeds'))).toBe(true);
    expect(donors.filter((d) => d.inputs.fragranceLot === 'EF-7802')).toHaveLength(1);
  });

  it('holds the bad lot in week 39, keeps it for hot from week 40, with 1.1 kg left', () => {
    const lot = quernby.lots.find((l) => l.code === 'EF-7802');
    expect(lot).toMatchObject({ standing: 'hot-process-only', quantityLeftG: 1100, certificateMaxFraction: 0.052, flashPointC: 88 });
    expect(lot?.standingChanges.map((c) => [c.on, c.by, c.after])).toEqual([['2025-05-27', 'benedikt', 'on-hold'], ['2025-06-04', 'ilse', 'hot-process-only']]);
    expect(withLot('EF-7802').filter((b) => isCold(b) && b.week >= 39)).toEqual([]);
    expect(quernby.lots.find((l) => l.code === 'GR-4188')).not.toHaveProperty('certificateMaxFraction');
  });

  it('hears of six lime bars without smell and of one skin reaction', () => {
    const inUse = story.flatMap((b) => b.inspections.filter((l) => l.stage === 'in-use').map((l) => ({ lot: b.inputs.fragranceLot, faults: l.findings.map((f) => f.fault) })));
    expect(inUse.filter((l) => l.faults.includes('scent-fade')).map((l) => l.lot?.slice(0, 2))).toEqual(Array.from({ length: 6 }, () => 'LS'));
    expect(inUse.filter((l) => l.faults.includes('customer-reaction')).map((l) => l.lot)).toEqual(['CS-6001']);
  });

  it('accounts for every bar of a closed batch', () => {
    for (const batch of quernby.batches.filter((b) => b.state === 'closed')) {
      expect(batch.dispositions.reduce((sum, d) => sum + d.bars, 0), batch.code).toBe(batch.inputs.bars);
      expect(batch.dispositions.every((d) => d.bars > 0)).toBe(true);
    }
    for (const batch of quernby.batches.filter((b) => b.state !== 'closed')) expect(batch.dispositions).toEqual([]);
  });

  it('takes from each lot only while it was there, and never more than came', () => {
    for (const lot of quernby.lots) {
      const users = quernby.batches.filter((b) => b.state !== 'planned' && b.inputs.ingredients.some((line) => line.lot === lot.code));
      const used = users.reduce((sum, b) => sum + b.inputs.ingredients.filter((line) => line.lot === lot.code).reduce((s, line) => s + line.massG, 0), 0);
      expect(used, lot.code).toBeLessThanOrEqual(lot.quantityG);
      for (const batch of users) expect(batch.madeOn >= lot.receivedOn, `${lot.code} in ${batch.code}`).toBe(true);
    }
  });

  it('has a second, small workshop with nothing in common', () => {
    const other = saltmarshKettle(demoDay);
    expect(other.batches).toHaveLength(12);
    expect(other.people[0]).toMatchObject({ role: 'owner', email: 'maren@saltmarshkettle.example' });
    const codes = new Set(quernby.lots.map((lot) => lot.code));
    expect(other.lots.some((lot) => codes.has(lot.code))).toBe(false);
  });
});
