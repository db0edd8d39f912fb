/** A part or busbar as selection, slips and notes name it: "element:<id>" or "bus:<id>". */
export type Subject = string;

export const partSubject = (id: string): Subject => `element:${id}`;
export const busSubject = (id: string): Subject => `bus:${id}`;

export function readSubject(subject: Subject): { kind: 'element' | 'bus'; id: string } | undefined {
  const at = subject.indexOf(':');
  const kind = subject.slice(0, at);
  if (kind !== 'element' && kind !== 'bus') return undefined;
  return { kind, id: subject.slice(at + 1) };
}

/** Ids of the selected parts and busbars. */
export function selectedIds(selection: readonly Subject[]): { parts: string[]; buses: string[] } {
  const parts: string[] = [];
  const buses: string[] = [];
  for (const subject of selection) {
    const read = readSubject(subject);
    if (read) (read.kind === 'element' ? parts : buses).push(read.id);
  }
  return { parts, buses };
}
