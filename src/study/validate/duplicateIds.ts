import { errorIssue, type Issue, isRecord } from './issue.ts';

/** An error for every record whose id an earlier record of the list already has; the path starts at the list. */
export function duplicateIds(records: readonly unknown[], noun: string): Issue[] {
  const first = new Map<string, number>();
  return records.flatMap((record, index): Issue[] => {
    const id = isRecord(record) ? record.id : undefined;
    if (typeof id !== 'string') return [];
    const earlier = first.get(id);
    if (earlier === undefined) {
      first.set(id, index);
      return [];
    }
    return [
      errorIssue(
        'duplicate-id',
        [index, 'id'],
        id,
        `${noun} ${index} has the id "${id}" of ${noun} ${earlier}; allowed is an id once in the list`,
      ),
    ];
  });
}

/** The ids of a list's records, in order, each once. */
export function idSet(records: readonly unknown[]): Set<string> {
  const ids = records.map((record) => (isRecord(record) ? record.id : undefined));
  return new Set(ids.filter((id): id is string => typeof id === 'string'));
}
