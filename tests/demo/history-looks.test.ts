import { describe, expect, it } from 'vitest';
import { saltmarshKettle } from '#server/demo/history/saltmarsh.ts';
import { catalogueFault } from '#server/features/faults/catalogue.ts';
import { answerable, appliesTo } from '#server/features/faults/checklist.ts';
import { stageOrder } from '#shared/words/stages.ts';
import { answerOf, demoDay, quernby, story } from './history-support.ts';

const saltmarsh = saltmarshKettle(demoDay);
const all = [...quernby.batches, ...saltmarsh.batches];

describe('looks of the invented workshops', () => {
  it('dates nothing on or after the day it is shown', () => {
    for (const batch of all) {
      if (batch.state !== 'planned' && batch.state !== 'making') expect(batch.madeOn < demoDay, batch.code).toBe(true);
      for (const at of [batch.pouredAt, ...batch.inspections.map((l) => l.at), ...batch.photos.map((p) => p.takenAt)]) expect((at ?? '') < demoDay, batch.code).toBe(true);
      for (const day of [batch.unmouldedOn, batch.cutOn]) expect((day ?? '') < demoDay, batch.code).toBe(true);
    }
    for (const lot of [...quernby.lots, ...saltmarsh.lots]) for (const change of lot.standingChanges) expect(change.on < demoDay, lot.code).toBe(true);
  });

  it('never answers for a fault before it can be seen, or one the method does not know', () => {
    for (const batch of all) {
      for (const look of batch.inspections) {
        for (const { fault, answer } of look.answers) {
          expect(answerable(fault, look.stage), `${batch.code} ${look.stage} ${fault}`).not.toBe('cannot');
          expect(appliesTo(fault, batch.inputs.method), `${batch.code} ${fault}`).toBe(true);
          if (answer !== 'not-checked') expect(stageOrder(look.stage)).toBeGreaterThanOrEqual(stageOrder(catalogueFault(fault).firstSeen));
        }
      }
    }
  });

  it('ties each finding to an answer "found", with a severity the fault has and bars the batch has', () => {
    for (const batch of all) {
      for (const look of batch.inspections) {
        expect(look.findings.map((f) => f.fault)).toEqual(look.answers.filter((a) => a.answer === 'found').map((a) => a.fault));
        for (const finding of look.findings) {
          expect(catalogueFault(finding.fault).severity[finding.severity], `${batch.code} ${finding.fault}`).toBeDefined();
          for (const bar of finding.bars ?? []) expect(bar >= 1 && bar <= batch.inputs.bars).toBe(true);
          if (finding.bars && look.barsLookedAt !== null) expect(finding.bars.length).toBeLessThanOrEqual(look.barsLookedAt);
        }
      }
    }
  });

  it('leaves a fault nobody looked for unanswered, also where it was there', () => {
    const unlooked = story.filter((b) => b.state === 'closed' && answerOf(b, 'drag-marks') === 'not-checked');
    expect(unlooked.length).toBeGreaterThan(2);
    expect(unlooked.some((b) => b.inspections.every((l) => l.stage !== 'cut'))).toBe(true);
    const stages = story.filter((b) => b.state === 'closed').map((b) => b.inspections.map((l) => l.stage));
    const missedWeek2 = stages.filter((done) => !done.includes('cure-w2')).length / stages.length;
    expect(missedWeek2).toBeGreaterThan(0.2);
    expect(missedWeek2).toBeLessThan(0.4);
  });

  it('has Tomasz skip about three times as many lines as the others', () => {
    const skipped = (tomasz: boolean) => {
      const answers = story.filter((b) => (b.inputs.maker === 'tomasz') === tomasz).flatMap((b) => b.inspections.flatMap((l) => l.answers));
      return answers.filter((a) => a.answer === 'not-checked').length / answers.length;
    };
    expect(skipped(true) / skipped(false)).toBeGreaterThan(2);
    expect(skipped(true) / skipped(false)).toBeLessThan(4.5);
  });

  it('photographs every cut, and between 420 and 480 things in all', () => {
    const cut = story.filter((b) => b.inspections.some((l) => l.stage === 'cut'));
    expect(cut.every((b) => b.photos.some((p) => p.stage === 'cut'))).toBe(true);
    const photos = quernby.batches.flatMap((b) => b.photos);
    expect(photos.length).toBeGreaterThanOrEqual(420);
    expect(photos.length).toBeLessThanOrEqual(480);
    const withCard = photos.filter((p) => p.hasGreyCard).length / photos.length;
    expect(withCard).toBeGreaterThan(0.74);
    expect(withCard).toBeLessThan(0.86);
  });

  it('marks on a photo only what was found at its look', () => {
    for (const batch of all) {
      for (const photo of batch.photos) {
        const found = batch.inspections.filter((l) => l.stage === photo.stage && l.at < photo.takenAt).flatMap((l) => l.findings.map((f) => f.fault));
        for (const fault of photo.marks) expect(found, `${batch.code} ${photo.stage}`).toContain(fault);
      }
    }
  });
});
