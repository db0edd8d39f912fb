export interface ExportProgress {
  /** Pages and figures finished. */
  done: number;
  total: number;
  /** e.g. "page 3 of 9". */
  what: string;
}

export interface ExportOptions {
  onProgress?: (progress: ExportProgress) => void;
  signal?: AbortSignal;
}
