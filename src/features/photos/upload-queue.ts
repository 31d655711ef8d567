import type { PhotoView, UploadedPhoto } from '#shared/photos.ts';
import type { Stage } from '#shared/words/stages.ts';
import { CallProblem } from '#src/lib/call.ts';
import { whyNotSent } from './fit-to-send.ts';
import type { PhotoToSend } from './send-photo.ts';

export interface UploadTo {
  batchId: string;
  /** Shown beside the upload on other screens. */
  batchCode: string;
  stage: Stage | null;
}

/** `reading`: all bytes are out and the server looks at them. `stopped`: can be tried again. `refused`: cannot. */
export type UploadState = 'waiting' | 'sending' | 'reading' | 'kept' | 'stopped' | 'refused';

export interface Upload extends UploadTo {
  id: string;
  fileName: string;
  bytes: number;
  sentBytes: number;
  state: UploadState;
  /** Why it waits, stopped or was refused. */
  reason: string | null;
  /** Address of the picture on this device. */
  preview: string;
}

export interface UploadQueueParts {
  send: (photo: PhotoToSend, onSent: (bytes: number) => void, signal: AbortSignal) => Promise<UploadedPhoto>;
  makeId: () => string;
  onKept: (photo: PhotoView) => void;
  /** Wait before try n (from 1), ms. */
  waitMs: (tries: number) => number;
  preview: { make: (file: File) => string; drop: (address: string) => void };
}

interface Job {
  file: File;
  tries: number;
  stop: AbortController | null;
  timer: ReturnType<typeof setTimeout> | null;
}

const AT_ONCE = 2;
const MOST_TRIES = 6;
const KEPT_SHOWN_MS = 3_000;

/** Waits grow to half a minute and are spread, so that phones that lost reception together do not come back together. */
export function growingWait(tries: number): number {
  return Math.min(30_000, 1_500 * 2 ** (tries - 1)) * (0.7 + Math.random() * 0.6);
}

/**
 * Photos on their way to the server, whatever screen is open: two at a time, tried again after growing waits,
 * each under one id however often it is sent, so that none is kept twice.
 */
export class UploadQueue {
  private uploads: readonly Upload[] = [];
  private readonly jobs = new Map<string, Job>();
  private readonly listeners = new Set<() => void>();

  constructor(private readonly parts: UploadQueueParts) {}

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  readonly snapshot = (): readonly Upload[] => this.uploads;

  add(files: Iterable<File>, tied: UploadTo): void {
    for (const file of files) {
      const [id, reason] = [this.parts.makeId(), whyNotSent(file)];
      this.jobs.set(id, { file, tries: 0, stop: null, timer: null });
      this.write([...this.uploads, { ...tied, id, fileName: file.name, bytes: file.size, sentBytes: 0, state: reason ? 'refused' : 'waiting', reason: reason ?? null, preview: this.parts.preview.make(file) }]);
    }
    this.sendNext();
  }

  /** Stops it and takes it off the list; what the server has already kept stays kept. */
  remove(id: string): void {
    this.drop(id);
    this.sendNext();
  }

  /** Sends a stopped one again, from the beginning of its waits. */
  tryAgain(id: string): void {
    const job = this.jobs.get(id);
    if (!job) return;
    job.tries = 0;
    this.change(id, { state: 'waiting', reason: null, sentBytes: 0 });
    this.sendNext();
  }

  /** Reception is back: everything that waits or stopped for it goes now. */
  tryAllAgain(): void {
    for (const { id, state } of this.uploads) {
      const job = this.jobs.get(id);
      if (job && (state === 'stopped' || (state === 'waiting' && job.timer))) {
        if (job.timer) clearTimeout(job.timer);
        job.timer = null;
        this.tryAgain(id);
      }
    }
  }

  /** Another person or workshop: nothing of the one before goes out under their name. */
  forgetAll(): void {
    for (const { id } of this.uploads) this.drop(id);
  }

  private drop(id: string): void {
    const job = this.jobs.get(id);
    const upload = this.uploads.find((other) => other.id === id);
    if (!job || !upload) return;
    this.jobs.delete(id);
    job.stop?.abort();
    if (job.timer) clearTimeout(job.timer);
    this.parts.preview.drop(upload.preview);
    this.write(this.uploads.filter((other) => other.id !== id));
  }

  private sendNext(): void {
    const busy = this.uploads.filter(({ state }) => state === 'sending' || state === 'reading').length;
    const ready = this.uploads.filter(({ id, state }) => state === 'waiting' && !this.jobs.get(id)?.timer);
    for (const upload of ready.slice(0, Math.max(0, AT_ONCE - busy))) void this.sendOne(upload);
  }

  private async sendOne({ id, batchId, stage, bytes }: Upload): Promise<void> {
    const job = this.jobs.get(id);
    if (!job) return;
    job.tries += 1;
    job.stop = new AbortController();
    this.change(id, { state: 'sending', reason: null, sentBytes: 0 });
    const onSent = (sent: number) => this.change(id, { sentBytes: Math.min(sent, bytes), ...(sent >= bytes ? { state: 'reading' as const } : {}) });
    try {
      const result = await this.parts.send({ id, file: job.file, batchId, stage }, onSent, job.stop.signal);
      if (result.outcome === 'refused') this.change(id, { state: 'refused', reason: result.reason });
      else this.kept(id, result.photo);
    } catch (error) {
      this.failed(id, job, error);
    }
    this.sendNext();
  }

  private kept(id: string, photo: PhotoView): void {
    this.change(id, { state: 'kept', reason: null });
    this.parts.onKept(photo);
    setTimeout(() => this.remove(id), KEPT_SHOWN_MS);
  }

  private failed(id: string, job: Job, error: unknown): void {
    if (!this.jobs.has(id)) return;
    const problem = error instanceof CallProblem ? error.problem : undefined;
    if (problem && problem.status < 500 && problem.status !== 429 && problem.status !== 401) {
      this.change(id, { state: 'refused', reason: problem.detail ?? problem.title });
    } else if (problem?.status === 401) {
      this.change(id, { state: 'stopped', reason: 'Sign in again, then send it once more' });
    } else if (job.tries >= MOST_TRIES) {
      this.change(id, { state: 'stopped', reason: `${problem?.title ?? 'No reception'}: tried ${job.tries} times` });
    } else {
      const wait = this.parts.waitMs(job.tries);
      job.timer = setTimeout(() => { job.timer = null; this.sendNext(); }, wait);
      this.change(id, { state: 'waiting', sentBytes: 0, reason: `${problem?.title ?? 'No reception'}; tries again in ${Math.max(1, Math.round(wait / 1000))} s` });
    }
  }

  private change(id: string, values: Partial<Upload>): void {
    this.write(this.uploads.map((upload) => (upload.id === id ? { ...upload, ...values } : upload)));
  }

  private write(uploads: readonly Upload[]): void {
    this.uploads = uploads;
    for (const listener of this.listeners) listener();
  }
}

/** Whether leaving the page would lose it. */
export function isUnfinished({ state }: Upload): boolean {
  return state === 'waiting' || state === 'sending' || state === 'reading' || state === 'stopped';
}
