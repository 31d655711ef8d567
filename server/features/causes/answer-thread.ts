import { parentPort } from 'node:worker_threads';
import { AnswerBench, type Question } from './answer-bench.ts';
import type { BatchFacts } from './batch-facts.ts';

export type ToThread =
  | { kind: 'open'; key: string; today: string }
  | { kind: 'rows'; key: string; facts: BatchFacts[] }
  | { kind: 'forget'; key: string }
  | { kind: 'ask'; id: number; key: string; question: Question };
export type FromThread = { id: number; answer: unknown; ms: number } | { id: number; problem: string };

const benches = new Map<string, AnswerBench>();
const port = parentPort;
if (!port) throw new Error('answer-thread runs inside a worker thread only');

port.on('message', (message: ToThread) => {
  switch (message.kind) {
    case 'open':
      benches.set(message.key, new AnswerBench(message.today));
      break;
    case 'rows':
      benches.get(message.key)?.add(message.facts);
      break;
    case 'forget':
      benches.delete(message.key);
      break;
    case 'ask':
      port.postMessage(answer(message));
  }
});

function answer({ id, key, question }: Extract<ToThread, { kind: 'ask' }>): FromThread {
  const started = performance.now();
  try {
    const bench = benches.get(key);
    if (!bench) throw new Error('the batches of this answer are gone');
    return { id, answer: bench.answer(question), ms: Math.round(performance.now() - started) };
  } catch (error) {
    return { id, problem: error instanceof Error ? (error.stack ?? error.message) : String(error) };
  }
}
