/** Something to be computed beside the page. A newer job of the same slot takes its place; equal keys are equal answers. */
export interface DeskJob<Task> {
  readonly slot: string;
  readonly key: string;
  readonly task: Task;
}

export interface DeskAnswer<Result> {
  readonly key: string;
  readonly result: Result;
}

/**
 * Keeps one job at a time with a worker, and hands out the newest of each slot only: what was asked for meanwhile and is
 * no longer wanted is never computed. The last answer of a slot stays until a newer one comes, so there is always something to draw.
 */
export class KernelDesk<Task, Result> {
  private answers: ReadonlyMap<string, DeskAnswer<Result>> = new Map();
  private wanted = new Map<string, DeskJob<Task>>();
  private atWork: DeskJob<Task> | null = null;
  /** Slots by when they were last served, the longest ago first. */
  private served: string[] = [];
  private readonly listeners = new Set<() => void>();

  /** `send` starts a job with the worker; its end is told by `take` or `fail`. */
  constructor(private readonly send: (task: Task) => void) {}

  readonly getAnswers = (): ReadonlyMap<string, DeskAnswer<Result>> => this.answers;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  /** All that is wanted now. Answers of slots that are no longer wanted are dropped. */
  want(jobs: readonly DeskJob<Task>[]): void {
    this.wanted = new Map(jobs.map((job) => [job.slot, job]));
    const kept = [...this.answers].filter(([slot]) => this.wanted.has(slot));
    if (kept.length < this.answers.size) this.tell(new Map(kept));
    this.next();
  }

  /** The answer of the job at work. */
  take(result: Result): void {
    const job = this.atWork;
    this.atWork = null;
    if (job && this.wanted.has(job.slot)) {
      this.tell(new Map(this.answers).set(job.slot, { key: job.key, result }));
    }
    this.next();
  }

  /** The job at work has no answer and is not tried again. */
  fail(): void {
    const job = this.atWork;
    this.atWork = null;
    if (job && this.wanted.get(job.slot)?.key === job.key) this.wanted.delete(job.slot);
    this.next();
  }

  private next(): void {
    if (this.atWork) return;
    const waiting = [...this.wanted.values()].filter(({ slot, key }) => this.answers.get(slot)?.key !== key);
    if (waiting.length === 0) return;
    const [job] = waiting.sort((one, other) => this.served.indexOf(one.slot) - this.served.indexOf(other.slot));
    this.served = [...this.served.filter((slot) => slot !== job.slot && this.wanted.has(slot)), job.slot];
    this.atWork = job;
    this.send(job.task);
  }

  private tell(answers: ReadonlyMap<string, DeskAnswer<Result>>): void {
    this.answers = answers;
    for (const listener of [...this.listeners]) listener();
  }
}
