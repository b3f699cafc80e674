import type { MeasurePool } from "../measure/measure-pool.ts";
import type { MeasureAnswer, MeasureTask } from "../measure/measure-task.ts";

/** Events looked at before their turn: enough to keep the measuring workers busy while rows are written. */
const AHEAD = 12;

/** Events in their order, each shown to `begin` a few places before its turn. */
export async function* lookingAhead<T>(
  events: Iterable<T>,
  begin: (event: T) => Promise<void>,
): AsyncGenerator<T> {
  const waiting: T[] = [];
  for (const event of events) {
    await begin(event);
    waiting.push(event);
    if (waiting.length <= AHEAD) continue;
    const next = waiting.shift();
    if (next !== undefined) yield next;
  }
  yield* waiting;
}

/** A pool that can be told of work before it is asked for; measuring is pure, so the answer is the same. */
export function measuringAhead(pool: MeasurePool): {
  readonly pool: MeasurePool;
  begin(task: MeasureTask): void;
} {
  const begun = new Map<string, Promise<unknown>>();
  return {
    begin(task) {
      const answer = pool.run(task);
      // Whoever asks for it is told of a failure; until then it must not end the process.
      answer.catch(() => undefined);
      begun.set(JSON.stringify(task), answer);
    },
    pool: {
      run<T extends MeasureTask>(task: T) {
        const key = JSON.stringify(task);
        const answer = begun.get(key);
        begun.delete(key);
        // The key holds the whole task, so the answer is of this task's kind.
        return answer === undefined ? pool.run(task) : (answer as Promise<MeasureAnswer<T>>);
      },
      close: () => pool.close(),
    },
  };
}
