import type { Study } from '../study/index.ts';
import type { Job, JobKind, Replies, ReplyMessage, RequestMessage, Settled } from './protocol.ts';

/** What the page needs of a Worker; tests put the computation itself behind it. */
export interface WorkerLike {
  postMessage(message: RequestMessage): void;
  terminate(): void;
  onmessage: ((event: MessageEvent<ReplyMessage>) => void) | null;
  onerror: ((event: ErrorEvent) => void) | null;
  onmessageerror: ((event: MessageEvent) => void) | null;
}

/** The study a request speaks of. A higher revision makes waiting requests of lower ones pointless. */
export interface StudyAt {
  revision: number;
  study: Study;
}

/** Lanes in the order they are served. Each holds one waiting request: the newest. */
const lanes = [
  'probe',
  'solve',
  'verdicts',
  'scan',
  'judge',
  'results',
  'dossiers',
  'judgeAll',
  'envelope',
  'worst',
  'warm',
] as const;
export type Lane = (typeof lanes)[number];

export interface ComputationOptions {
  spawn: () => WorkerLike;
  /** Told when the worker was restarted or given up (words), and when it answers again (null). */
  report?: (message: string | null) => void;
  /** A job running longer is taken for hung and the worker restarted. */
  timeLimitMs?: number;
}

interface Ticket {
  lane: Lane;
  job: Job;
  at: StudyAt | null;
  crashes: number;
  settled: boolean;
  settle: (end: Settled<unknown>) => void;
}

const maxCrashesInARow = 3;

/**
 * Hands requests to the worker one at a time, so that the next one sent is always the most urgent of the
 * newest, and settles every one of them.
 *
 *            ask ─────────► waiting (one per lane) ──served──► running ──reply──► done | failed
 *                              │      ▲                          │
 *            newer in its lane │      └── once more ── crash ────┤
 *            or newer revision ▼                                 ▼
 *                          superseded            failed: crashed twice, or over the time limit
 *
 * A crash restarts the worker and reports it; three in a row without an answer in between give it up.
 */
export class Dispatcher {
  private readonly waiting = new Map<Lane, Ticket>();
  private readonly spawn: () => WorkerLike;
  private readonly report: (message: string | null) => void;
  private readonly timeLimitMs: number;
  private worker: WorkerLike | null = null;
  private running: Ticket | null = null;
  private watchdog: ReturnType<typeof setTimeout> | undefined;
  /** The revision the worker keeps; null for a fresh one. */
  private heldRevision: number | null = null;
  private messageId = 0;
  private crashesInARow = 0;
  private hasReported = false;
  private ended: Settled<never> | null = null;

  constructor({ spawn, report = () => {}, timeLimitMs = 60_000 }: ComputationOptions) {
    this.spawn = spawn;
    this.report = report;
    this.timeLimitMs = timeLimitMs;
  }

  ask<K extends JobKind>(
    lane: Lane,
    job: Extract<Job, { kind: K }>,
    at: StudyAt | null,
  ): Promise<Settled<Replies[K]>> {
    if (this.ended) return Promise.resolve(this.ended);
    return new Promise((resolve) => {
      this.dropOlder(lane, at);
      // The reply to a job is of the type Replies pairs with it; the one place this is asserted.
      const settle = (outcome: Settled<unknown>): void => resolve(outcome as Settled<Replies[K]>);
      this.waiting.set(lane, { lane, job, at, crashes: 0, settled: false, settle });
      this.serve();
    });
  }

  cancel(lane?: Lane): void {
    for (const [name, ticket] of [...this.waiting]) {
      if (lane !== undefined && name !== lane) continue;
      this.waiting.delete(name);
      end(ticket, { outcome: 'cancelled' });
    }
    const { running } = this;
    if (running && (lane === undefined || running.lane === lane)) end(running, { outcome: 'cancelled' });
  }

  close(): void {
    this.ended ??= { outcome: 'cancelled' };
    this.cancel();
    this.stopWorker();
  }

  /** Whatever waits in the same lane or speaks of an older revision gives way. */
  private dropOlder(lane: Lane, at: StudyAt | null): void {
    for (const [other, ticket] of [...this.waiting]) {
      const older = at !== null && ticket.at !== null && ticket.at.revision < at.revision;
      if (other !== lane && !older) continue;
      this.waiting.delete(other);
      end(ticket, { outcome: 'superseded' });
    }
  }

  private serve(): void {
    if (this.running || this.ended) return;
    const lane = lanes.find((name) => this.waiting.has(name));
    if (!lane) return;
    const ticket = this.waiting.get(lane) as Ticket;
    this.waiting.delete(lane);
    this.running = ticket;
    this.watchdog = setTimeout(() => this.hung(ticket), this.timeLimitMs);
    try {
      this.worker ??= this.start();
      this.worker.postMessage(this.messageOf(ticket));
    } catch (error) {
      this.crashed(error instanceof Error ? error.message : String(error));
    }
  }

  private messageOf({ job, at }: Ticket): RequestMessage {
    this.messageId += 1;
    const id = this.messageId;
    if (!at) return { id, revision: this.heldRevision ?? 0, job };
    if (this.heldRevision === at.revision) return { id, revision: at.revision, job };
    this.heldRevision = at.revision;
    return { id, revision: at.revision, study: at.study, job };
  }

  private start(): WorkerLike {
    const fresh = this.spawn();
    this.heldRevision = null;
    fresh.onmessage = ({ data }) => this.answered(data);
    fresh.onerror = (event) => this.crashed(event.message ?? '');
    fresh.onmessageerror = () => this.crashed('its answer could not be read');
    return fresh;
  }

  private stopWorker(): void {
    clearTimeout(this.watchdog);
    if (this.worker) {
      this.worker.onmessage = this.worker.onerror = this.worker.onmessageerror = null;
      this.worker.terminate();
    }
    this.worker = null;
    this.heldRevision = null;
    this.running = null;
  }

  private answered(message: ReplyMessage): void {
    const ticket = this.running;
    if (!ticket || message.id !== this.messageId) return;
    clearTimeout(this.watchdog);
    this.running = null;
    this.crashesInARow = 0;
    if (this.hasReported) this.report(null);
    this.hasReported = false;
    if ('failed' in message) end(ticket, { outcome: 'failed', message: message.failed });
    else end(ticket, { outcome: 'done', value: message.reply });
    this.serve();
  }

  private crashed(reason: string): void {
    const ticket = this.running;
    this.stopWorker();
    this.crashesInARow += 1;
    const because = reason === '' ? '' : ` (${reason})`;
    if (this.crashesInARow >= maxCrashesInARow) {
      const times = `The computation stopped ${this.crashesInARow} times${because}.`;
      this.giveUp(ticket, `${times} Save the study to a file and reload the page.`);
      return;
    }
    this.tell(`The computation stopped${because} and was restarted.`);
    if (ticket) this.tryAgain(ticket, `The computation stopped twice over this request${because}.`);
    this.serve();
  }

  private tryAgain(ticket: Ticket, message: string): void {
    ticket.crashes += 1;
    if (ticket.crashes > 1) end(ticket, { outcome: 'failed', message });
    else if (this.waiting.has(ticket.lane)) end(ticket, { outcome: 'superseded' });
    else if (!ticket.settled) this.waiting.set(ticket.lane, ticket);
  }

  private hung(ticket: Ticket): void {
    const message = `The computation took longer than ${this.timeLimitMs / 1000} s; it was stopped and restarted.`;
    this.stopWorker();
    this.tell(message);
    end(ticket, { outcome: 'failed', message });
    this.serve();
  }

  private giveUp(ticket: Ticket | null, message: string): void {
    const failed: Settled<never> = { outcome: 'failed', message };
    this.ended = failed;
    this.tell(message);
    if (ticket) end(ticket, failed);
    const tickets = [...this.waiting.values()];
    this.waiting.clear();
    for (const other of tickets) end(other, failed);
  }

  private tell(message: string): void {
    this.hasReported = true;
    this.report(message);
  }
}

function end(ticket: Ticket, outcome: Settled<unknown>): void {
  if (ticket.settled) return;
  ticket.settled = true;
  ticket.settle(outcome);
}
