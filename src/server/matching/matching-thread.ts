/** One worker thread: takes tasks, answers them in order, reports progress, and can be ended at any moment. */
import { join } from 'node:path';
import { Worker } from 'node:worker_threads';
import type { Answers, Task, ThreadAnswer } from './matching-tasks';

type Progress = (share: number, stage: string) => void;

interface Waiting {
  resolve(result: unknown): void;
  reject(error: Error): void;
  progress: Progress | undefined;
}

/** The thread was ended before it answered. */
export class ThreadEnded extends Error {
  constructor() {
    super('The matching thread was ended');
    this.name = 'ThreadEnded';
  }
}

export class MatchingThread {
  private worker: Worker | null = null;
  private readonly waiting = new Map<number, Waiting>();
  private last = 0;

  constructor(private readonly root: string) {}

  ask<K extends Task['kind']>(task: Extract<Task, { kind: K }>, progress?: Progress): Promise<Answers[K]> {
    const id = ++this.last;
    return new Promise((resolve, reject) => {
      this.waiting.set(id, { resolve: (result) => resolve(result as Answers[K]), reject, progress });
      this.running().postMessage({ id, task });
    });
  }

  /** Ends at once whatever it works on; waiting questions are refused with ThreadEnded. */
  async end(): Promise<void> {
    const worker = this.worker;
    this.worker = null;
    await worker?.terminate();
    this.refuseAll(new ThreadEnded());
  }

  private running(): Worker {
    if (this.worker) return this.worker;
    const worker = new Worker(join(this.root, 'dist/jobs/matching.worker.mjs'));
    // A thread that waits for questions must not keep the process alive.
    worker.unref();
    worker.on('message', (answer: ThreadAnswer) => this.hear(answer));
    worker.on('error', (error) => this.lose(worker, error));
    worker.on('exit', () => this.lose(worker, new ThreadEnded()));
    this.worker = worker;
    return worker;
  }

  private lose(worker: Worker, error: Error): void {
    if (this.worker !== worker) return;
    this.worker = null;
    this.refuseAll(error);
  }

  private refuseAll(error: Error): void {
    for (const waiting of this.waiting.values()) waiting.reject(error);
    this.waiting.clear();
  }

  private hear(answer: ThreadAnswer): void {
    const waiting = this.waiting.get(answer.id);
    if (!waiting) return;
    if ('share' in answer) return waiting.progress?.(answer.share, answer.stage);
    this.waiting.delete(answer.id);
    if ('fault' in answer) waiting.reject(new Error(answer.fault));
    else waiting.resolve(answer.result);
  }
}

const threads = new Map<string, MatchingThread>();

/** The process's thread for questions; runs get threads of their own. */
export function questionThread(root: string): MatchingThread {
  const known = threads.get(root);
  if (known) return known;
  const made = new MatchingThread(root);
  threads.set(root, made);
  return made;
}
