import { Worker } from 'node:worker_threads';
import { busy } from '#server/problem.ts';
import type { AnswerTo, Question } from './answer-bench.ts';
import type { FromThread, ToThread } from './answer-thread.ts';
import type { BatchFacts } from './batch-facts.ts';

export interface Answered<A extends Question['ask']> {
  answer: AnswerTo[A];
  computedAt: Date;
  ms: number;
}

/** At most so many threads, benches kept and batches on all of them; a batch takes some 2 KB. */
const LIMITS = { threads: 2, benches: 24, batches: 250_000, waiting: 40 };

interface Waiting { thread: Thread; resolve: (answer: { answer: unknown; ms: number }) => void; reject: (error: Error) => void }
interface Thread { worker: Worker; open: number }

/** The batches of one workshop, revision and filter, on the thread that holds them. */
export class Bench {
  batches = 0;
  /** Requests that are using it; it is not given up under them. */
  users = 0;
  readonly answers = new Map<string, Promise<Answered<Question['ask']>>>();
  /** Set once all rows are on the thread. */
  filled: Promise<void> = Promise.resolve();

  constructor(readonly key: string, readonly thread: Thread) {}
}

/**
 * Works out answers away from the thread that serves requests, and keeps them.
 *
 * The key names workshop, revision of its data and filter, so an answer is never old and never another
 * workshop's; who asks while it is being worked out waits for the same one.
 */
export class AnswerPool {
  private readonly threads: Thread[] = [];
  private readonly benches = new Map<string, Bench>();
  private readonly waiting = new Map<number, Waiting>();
  private questions = 0;
  private isClosed = false;

  /**
   * The bench of a key, for the caller to `release` when done. Whoever gets `loading` is the first and awaits it
   * inside the transaction that reads the rows; the others await `filled` outside of any.
   */
  open(key: string, today: string, fill: () => AsyncIterable<BatchFacts[]>): { bench: Bench; loading: Promise<void> | null } {
    const known = this.benches.get(key);
    if (known) {
      this.benches.delete(key);
      this.benches.set(key, known);
      known.users++;
      return { bench: known, loading: null };
    }
    if (this.waiting.size >= LIMITS.waiting || this.isClosed) throw busy('Many answers are being worked out just now');
    const bench = new Bench(key, this.leastBusy());
    this.benches.set(key, bench);
    bench.users = 1;
    bench.thread.open++;
    this.send(bench.thread, { kind: 'open', key, today });
    const loading = this.load(bench, fill);
    bench.filled = loading;
    // Whoever waits for it is told by `loading`; nobody waiting must not end the process.
    loading.catch(() => this.forget(bench));
    this.makeRoom();
    return { bench, loading };
  }

  /** The answer to a question about a filled bench; worked out once. */
  ask<Q extends Question>(bench: Bench, question: Q): Promise<Answered<Q['ask']>> {
    const name = JSON.stringify(question);
    const known = bench.answers.get(name);
    if (known) return known as Promise<Answered<Q['ask']>>;
    const asked = new Promise<{ answer: unknown; ms: number }>((resolve, reject) => {
      const id = (this.questions += 1);
      this.waiting.set(id, { thread: bench.thread, resolve, reject });
      this.send(bench.thread, { kind: 'ask', id, key: bench.key, question });
    }).then(({ answer, ms }) => ({ answer, ms, computedAt: new Date() }) as Answered<Q['ask']>);
    bench.answers.set(name, asked as Promise<Answered<Question['ask']>>);
    asked.catch(() => bench.answers.delete(name));
    return asked;
  }

  release(bench: Bench): void {
    bench.users--;
    this.makeRoom();
  }

  /** How many benches and batches are kept. */
  get size(): { benches: number; batches: number } {
    return { benches: this.benches.size, batches: [...this.benches.values()].reduce((sum, bench) => sum + bench.batches, 0) };
  }

  async close(): Promise<void> {
    this.isClosed = true;
    this.benches.clear();
    await Promise.all(this.threads.map(({ worker }) => worker.terminate()));
    for (const { reject } of this.waiting.values()) reject(busy('The server is stopping'));
    this.waiting.clear();
  }

  private async load(bench: Bench, fill: () => AsyncIterable<BatchFacts[]>): Promise<void> {
    for await (const facts of fill()) {
      bench.batches += facts.length;
      this.send(bench.thread, { kind: 'rows', key: bench.key, facts });
    }
    this.makeRoom();
  }

  private makeRoom(): void {
    for (const old of [...this.benches.values()]) {
      const { benches, batches } = this.size;
      if (benches <= LIMITS.benches && batches <= LIMITS.batches) break;
      if (old.users === 0) this.forget(old);
    }
  }

  private forget(bench: Bench): void {
    if (this.benches.get(bench.key) === bench) this.benches.delete(bench.key);
    bench.thread.open--;
    this.send(bench.thread, { kind: 'forget', key: bench.key });
  }

  private leastBusy(): Thread {
    const free = this.threads.find((thread) => thread.open === 0);
    if (free) return free;
    if (this.threads.length < LIMITS.threads) return this.startThread();
    return this.threads.reduce((best, thread) => (thread.open < best.open ? thread : best));
  }

  private startThread(): Thread {
    const worker = new Worker(new URL('answer-thread.mjs', import.meta.url), { execArgv: [], resourceLimits: { maxOldGenerationSizeMb: 1024 } });
    const thread: Thread = { worker, open: 0 };
    worker.unref();
    worker.on('message', (message: FromThread) => this.settle(message));
    worker.on('error', (error) => this.lose(thread, error));
    worker.on('exit', () => this.lose(thread, new Error('an answer thread ended')));
    this.threads.push(thread);
    return thread;
  }

  private settle(message: FromThread): void {
    const waiting = this.waiting.get(message.id);
    this.waiting.delete(message.id);
    if ('problem' in message) waiting?.reject(new Error(message.problem));
    else waiting?.resolve(message);
  }

  /** A thread that ended takes its benches with it; the next request starts anew. */
  private lose(thread: Thread, error: Error): void {
    const place = this.threads.indexOf(thread);
    if (place >= 0) this.threads.splice(place, 1);
    for (const [key, bench] of this.benches) if (bench.thread === thread) this.benches.delete(key);
    for (const [id, { thread: own, reject }] of this.waiting) {
      if (own !== thread) continue;
      this.waiting.delete(id);
      reject(error);
    }
  }

  private send(thread: Thread, message: ToThread): void {
    thread.worker.postMessage(message);
  }
}
