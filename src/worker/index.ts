export { type Computation, createComputation } from './client.ts';
export type { ComputationOptions, Lane, StudyAt, WorkerLike } from './dispatcher.ts';
export type {
  CaseDossier,
  CaseNumbers,
  Probe,
  ReplyMessage,
  RequestMessage,
  ScanPair,
  Settled,
  WorstEnd,
  WorstQuestion,
} from './protocol.ts';
export { spawnWorker } from './spawnWorker.ts';
