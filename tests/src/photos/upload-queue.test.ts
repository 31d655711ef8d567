import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { PhotoView, UploadedPhoto } from '#shared/photos.ts';
import { growingWait, isUnfinished, UploadQueue, type UploadQueueParts } from '#src/features/photos/upload-queue.ts';
import { CallProblem, NoReception } from '#src/lib/call.ts';

const tied = { batchId: 'b1', batchCode: 'T-0001', stage: 'cut' as const };
const aFile = (name: string, bytes = 2048, type = 'image/jpeg') => new File([new Uint8Array(bytes)], name, { type });
const kept = (id: string): UploadedPhoto => ({ outcome: 'kept', fileName: 'x', photo: { id } as PhotoView });
const problem = (status: number, detail: string) => new CallProblem({ type: '/problems/x', title: 'Title', status, detail });

/** A queue whose sending is answered by hand. */
function aQueue() {
  const sent: { id: string; onSent: (bytes: number) => void; resolve: (result: UploadedPhoto) => void; reject: (error: unknown) => void; signal: AbortSignal }[] = [];
  let next = 0;
  const parts: UploadQueueParts = {
    send: ({ id }, onSent, signal) => new Promise((resolve, reject) => sent.push({ id, onSent, resolve, reject, signal })),
    makeId: () => `id-${(next += 1)}`,
    onKept: vi.fn(),
    waitMs: (tries) => tries * 1000,
    preview: { make: () => 'blob:x', drop: vi.fn() },
  };
  const queue = new UploadQueue(parts);
  return { queue, sent, parts, states: () => queue.snapshot().map(({ fileName, state }) => `${fileName} ${state}`) };
}

describe('photos on their way', () => {
  beforeEach(() => void vi.useFakeTimers());
  afterEach(() => void vi.useRealTimers());
  const settle = () => vi.advanceTimersByTimeAsync(0);

  it('go two at a time, tell how far they are, and leave the list when kept', async () => {
    const { queue, sent, parts, states } = aQueue();
    queue.add([aFile('a.jpg'), aFile('b.jpg'), aFile('c.jpg')], tied);
    expect(states()).toEqual(['a.jpg sending', 'b.jpg sending', 'c.jpg waiting']);
    sent[0]?.onSent(1024);
    expect(queue.snapshot()[0]).toMatchObject({ sentBytes: 1024, state: 'sending' });
    sent[0]?.onSent(2300);
    expect(queue.snapshot()[0]).toMatchObject({ sentBytes: 2048, state: 'reading' });
    sent[0]?.resolve(kept('id-1'));
    await settle();
    expect(states()).toEqual(['a.jpg kept', 'b.jpg sending', 'c.jpg sending']);
    expect(parts.onKept).toHaveBeenCalledExactlyOnceWith({ id: 'id-1' });
    await vi.advanceTimersByTimeAsync(5_000);
    expect(states()).toEqual(['b.jpg sending', 'c.jpg sending']);
    expect(parts.preview.drop).toHaveBeenCalledTimes(1);
  });

  it('are tried again after growing waits under the same id, then stop and can be sent by hand', async () => {
    const { queue, sent } = aQueue();
    queue.add([aFile('a.jpg')], tied);
    for (let tries = 1; tries <= 5; tries += 1) {
      sent.at(-1)?.reject(new NoReception());
      await settle();
      expect(queue.snapshot()[0]).toMatchObject({ state: 'waiting', reason: `No reception; tries again in ${tries} s` });
      await vi.advanceTimersByTimeAsync(tries * 1000);
    }
    sent.at(-1)?.reject(new NoReception());
    await settle();
    expect(queue.snapshot()[0]).toMatchObject({ state: 'stopped', reason: 'No reception: tried 6 times' });
    expect(sent.map(({ id }) => id)).toEqual(Array.from({ length: 6 }, () => 'id-1'));
    queue.tryAgain('id-1');
    expect(sent).toHaveLength(7);
    expect(queue.snapshot()[0]?.state).toBe('sending');
  });

  it('go at once when reception is back', async () => {
    const { queue, sent } = aQueue();
    queue.add([aFile('a.jpg')], tied);
    sent[0]?.reject(new NoReception());
    await settle();
    queue.tryAllAgain();
    expect(sent).toHaveLength(2);
    await vi.advanceTimersByTimeAsync(60_000);
    expect(sent).toHaveLength(2);
  });

  it('wait while the server is busy, and are refused for good where it says no', async () => {
    const { queue, sent } = aQueue();
    queue.add([aFile('busy.jpg'), aFile('no.jpg')], tied);
    sent[0]?.reject(problem(503, 'busy'));
    sent[1]?.reject(problem(413, 'A photo may weigh at most 25 MiB'));
    await settle();
    expect(queue.snapshot().map(({ state, reason }) => [state, reason])).toEqual([['waiting', 'Title; tries again in 1 s'], ['refused', 'A photo may weigh at most 25 MiB']]);
    queue.add([aFile('damaged.jpg')], tied);
    sent[2]?.resolve({ outcome: 'refused', fileName: 'damaged.jpg', reason: 'The picture is damaged' });
    await settle();
    expect(queue.snapshot()[2]).toMatchObject({ state: 'refused', reason: 'The picture is damaged' });
  });

  it('ask for a sign-in where the session ended, and keep the photo', async () => {
    const { queue, sent } = aQueue();
    queue.add([aFile('a.jpg')], tied);
    sent[0]?.reject(problem(401, 'Sign in'));
    await settle();
    expect(queue.snapshot()[0]).toMatchObject({ state: 'stopped', reason: 'Sign in again, then send it once more' });
  });

  it('can be stopped, which lets the next one go', async () => {
    const { queue, sent, states } = aQueue();
    queue.add([aFile('a.jpg'), aFile('b.jpg'), aFile('c.jpg')], tied);
    queue.remove('id-1');
    expect(sent[0]?.signal.aborted).toBe(true);
    sent[0]?.reject(new DOMException('stopped', 'AbortError'));
    await settle();
    expect(states()).toEqual(['b.jpg sending', 'c.jpg sending']);
  });

  it('are not sent at all when they are too heavy, empty or no photo, each with its reason', () => {
    const { queue, sent } = aQueue();
    const heavy = aFile('heavy.jpg');
    Object.defineProperty(heavy, 'size', { value: 26.5 * 1024 * 1024 });
    queue.add([heavy, aFile('empty.jpg', 0), aFile('IMG_1.HEIC', 10, ''), aFile('list.pdf', 10, 'application/pdf'), aFile('unknown', 10, '')], tied);
    expect(queue.snapshot().map(({ state, reason }) => [state, reason?.slice(0, 30) ?? null])).toEqual([
      ['refused', 'It weighs 26.5 MiB; a photo ma'], ['refused', 'The file is empty; choose it a'], ['refused', 'HEIC pictures cannot be read h'], ['refused', 'This is not a photo; send a JP'], ['sending', null],
    ]);
    expect(sent).toHaveLength(1);
    expect(queue.snapshot().filter(isUnfinished)).toHaveLength(1);
  });

  it('are forgotten when another person signs in', () => {
    const { queue, sent } = aQueue();
    queue.add([aFile('a.jpg'), aFile('b.jpg'), aFile('c.jpg')], tied);
    queue.forgetAll();
    expect(queue.snapshot()).toEqual([]);
    expect(sent.every(({ signal }) => signal.aborted)).toBe(true);
    expect(sent).toHaveLength(2);
  });

  it('never wait longer than about half a minute', () => {
    for (let tries = 1; tries < 20; tries += 1) expect(growingWait(tries)).toBeLessThanOrEqual(39_000);
    expect(growingWait(1)).toBeLessThan(2_000);
  });
});
