import type { ReplyMessage, RequestMessage, WorkerLike } from '../../src/worker/index.ts';

/** A worker that does nothing by itself: the test reads what it was sent and says what it answers. */
export class ScriptedWorker implements WorkerLike {
  onmessage: WorkerLike['onmessage'] = null;
  onerror: WorkerLike['onerror'] = null;
  onmessageerror: WorkerLike['onmessageerror'] = null;
  readonly sent: RequestMessage[] = [];
  terminated = false;

  postMessage(message: RequestMessage): void {
    this.sent.push(message);
  }

  terminate(): void {
    this.terminated = true;
  }

  get last(): RequestMessage {
    const message = this.sent.at(-1);
    if (!message) throw new Error('nothing was sent');
    return message;
  }

  /** Answers the message sent last. */
  reply(reply: Extract<ReplyMessage, { reply: unknown }>['reply']): void {
    this.onmessage?.({ data: { id: this.last.id, reply } } as MessageEvent<ReplyMessage>);
  }

  fail(failed: string): void {
    this.onmessage?.({ data: { id: this.last.id, failed } } as MessageEvent<ReplyMessage>);
  }

  crash(message: string): void {
    this.onerror?.({ message } as ErrorEvent);
  }
}
