import type { RequestMessage } from './protocol.ts';
import { createSession } from './session.ts';
import { transferables } from './transferables.ts';

// Outside a worker (a test importing the module) nothing is listened to.
if (typeof WorkerGlobalScope !== 'undefined' && self instanceof WorkerGlobalScope) {
  const scope = self as DedicatedWorkerGlobalScope;
  const session = createSession();
  scope.onmessage = ({ data }: MessageEvent<RequestMessage>) => {
    const reply = session.handle(data);
    scope.postMessage(reply, transferables(reply));
  };
}
