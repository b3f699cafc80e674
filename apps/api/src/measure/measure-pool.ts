import { Worker } from "node:worker_threads";
import { Refusal, refusal } from "../http/refusal.ts";
import type { MeasureAnswer, MeasureTask } from "./measure-task.ts";

/** Tasks that may wait before the server says it is busy: a few seconds of work. */
const WAITING_MAX = 200;

interface Waiting {
  readonly task: MeasureTask;
  readonly resolve: (answer: unknown) => void;
  readonly reject: (error: Error) => void;
}

/** Measures in worker threads, so that the event loop stays free. */
export interface MeasurePool {
  /** @throws Refusal busy when too much waits already */
  run<T extends MeasureTask>(task: T): Promise<MeasureAnswer<T>>;
  close(): Promise<void>;
}

/** One worker and what it works on. */
interface Bench {
  readonly worker: Worker;
  current: Waiting | null;
}

/**
 * A pool of measuring workers.
 * @param script path of the worker's bundle
 * @param size workers, 1 or more
 */
export function measurePool(script: string | URL, size: number): MeasurePool {
  const queue: Waiting[] = [];
  const benches = new Set<Bench>();
  let closed = false;

  function open(): Bench {
    const worker = new Worker(script);
    const bench: Bench = { worker, current: null };
    worker.on("message", (answer: unknown) => settle(bench, (waiting) => waiting.resolve(answer)));
    // A worker that dies takes only its task with it; another is started in its place.
    worker.on("error", (error) => {
      benches.delete(bench);
      bench.current?.reject(error instanceof Error ? error : new Error(String(error)));
      if (!closed) benches.add(open());
      feed();
    });
    worker.unref();
    return bench;
  }

  function settle(bench: Bench, give: (waiting: Waiting) => void): void {
    const waiting = bench.current;
    bench.current = null;
    if (waiting) give(waiting);
    feed();
  }

  function feed(): void {
    for (const bench of benches) {
      if (bench.current) continue;
      const next = queue.shift();
      if (!next) return;
      bench.current = next;
      bench.worker.postMessage(next.task);
    }
  }

  for (let i = 0; i < size; i += 1) benches.add(open());

  return {
    run: <T extends MeasureTask>(task: T) =>
      new Promise<MeasureAnswer<T>>((resolve, reject) => {
        if (queue.length >= WAITING_MAX) {
          const { faults } = refusal("busy", `${queue.length} scans wait to be measured.`);
          reject(new Refusal(faults, 2));
          return;
        }
        // The worker answers each kind of task with its own answer, in the order asked.
        queue.push({ task, resolve: resolve as (answer: unknown) => void, reject });
        feed();
      }),
    close: async () => {
      closed = true;
      await Promise.all([...benches].map((bench) => bench.worker.terminate()));
    },
  };
}
