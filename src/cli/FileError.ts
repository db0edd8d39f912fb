/** A file the user named that cannot be read or written; the message says why in the system's words. */
export class FileError extends Error {
  constructor(what: string, cause: unknown) {
    super(`${what}: ${cause instanceof Error ? cause.message : String(cause)}`, { cause });
  }
}
