import type { Worker } from 'node:worker_threads';
import { Refusal } from '../refusal';
import { READY, startThread } from './parseThread';

export interface QueueOptions<Answer> {
  /** Program of the thread. */
  url: URL;
  /** Milliseconds of processor time a single text may take, once the thread runs, before the thread is ended. */
  limit: number;
  /** Milliseconds it may take at the most, however busy the machine is. */
  patience: number;
  /** Milliseconds the thread may take to start. */
  startLimit: number;
  /** Texts that may wait for the thread. */
  places: number;
  /** The answer to a text that took too long, and to one that the thread broke at. */
  tooLong: Answer;
  broke: Answer;
}

interface Waiting<Question, Answer> {
  question: Question;
  answer: (answer: Answer) => void;
}

/** Share of `limit` that the whole process must have run before a text is held to be the cause. */
const RAN = 0.75;

const busy = () =>
  new Refusal(503, 'busy', 'Busy', 'Too many texts are being checked. Nothing was saved; try again in a moment.', {
    headers: { 'Retry-After': '2' },
  });

/**
 * A reader of foreign texts in a thread of its own. They are taken one after the other; one that runs into `limit` ends the
 * thread and is refused in a sentence, and the next text gets a new thread.
 */
export class ParseQueue<Question, Answer extends object> {
  readonly #options: QueueOptions<Answer>;
  readonly #waiting: Waiting<Question, Answer>[] = [];
  #current: Waiting<Question, Answer> | null = null;
  #thread: Worker | null = null;
  #isReady = false;
  #timer: NodeJS.Timeout | undefined;

  constructor(options: QueueOptions<Answer>) {
    this.#options = options;
  }

  /** What the thread makes of a text, or one of the two refusals. Rejects with a 503 refusal when too many texts wait. */
  parse(question: Question): Promise<Answer> {
    if (this.#waiting.length >= this.#options.places) return Promise.reject(busy());
    return new Promise((answer) => {
      this.#waiting.push({ question, answer });
      this.#next();
    });
  }

  /** Starts the thread ahead of the first text, which would otherwise wait for it. */
  start(): void {
    this.#thread ??= this.#start();
    if (!this.#current) this.#thread.unref();
  }

  /** Ends the thread. Texts that still wait are refused. */
  async close(): Promise<void> {
    this.#waiting.splice(0).forEach(({ answer }) => answer(this.#options.broke));
    await this.#end(this.#options.broke);
  }

  #next(): void {
    if (this.#current || this.#waiting.length === 0) return;
    this.#current = this.#waiting.shift() ?? null;
    const thread = (this.#thread ??= this.#start());
    // While somebody waits for an answer the process must not end.
    thread.ref();
    if (this.#isReady) this.#ask();
    else this.#timer = setTimeout(() => void this.#end(this.#options.broke), this.#options.startLimit);
  }

  #start(): Worker {
    const thread = startThread(this.#options.url);
    thread.on('message', (message: Answer | typeof READY) => {
      if (message === READY) {
        this.#isReady = true;
        this.#ask();
      } else this.#finish(message as Answer);
    });
    thread.on('error', () => void this.#end(this.#options.broke));
    thread.on('exit', () => void this.#end(this.#options.broke));
    return thread;
  }

  #ask(): void {
    clearTimeout(this.#timer);
    if (!this.#current) return;
    this.#watch(process.cpuUsage(), this.#options.patience);
    this.#thread?.postMessage(this.#current.question);
  }

  /** On a machine that is busy with other work the clock says little about a text: a process that hardly ran gets longer. */
  #watch(since: NodeJS.CpuUsage, patience: number): void {
    const { limit } = this.#options;
    this.#timer = setTimeout(() => {
      const { user, system } = process.cpuUsage(since);
      if ((user + system) / 1000 < limit * RAN && patience > limit) this.#watch(since, patience - limit);
      else void this.#end(this.#options.tooLong);
    }, limit);
  }

  #finish(answer: Answer): void {
    clearTimeout(this.#timer);
    const done = this.#current;
    this.#current = null;
    this.#thread?.unref();
    done?.answer(answer);
    this.#next();
  }

  async #end(because: Answer): Promise<void> {
    const thread = this.#thread;
    this.#thread = null;
    this.#isReady = false;
    thread?.removeAllListeners();
    // A thread that is being ended may still report; nobody waits for it any more.
    thread?.on('error', () => undefined);
    const ended = thread?.terminate();
    if (this.#current) this.#finish(because);
    await ended;
  }
}
