/** The buffers of every typed array within a message, each once: they move to the other side uncopied. */
export function transferables(message: unknown): ArrayBuffer[] {
  const found = new Set<ArrayBuffer>();
  collect(message, found);
  return [...found];
}

function collect(value: unknown, found: Set<ArrayBuffer>): void {
  if (typeof value !== 'object' || value === null) return;
  if (ArrayBuffer.isView(value)) {
    if (value.buffer instanceof ArrayBuffer) found.add(value.buffer);
    return;
  }
  for (const inner of Object.values(value)) collect(inner, found);
}
