import { type FieldOwner, fieldsOf } from '../fields/fieldsOf.ts';
import { recordSchema, refusals, valueAt } from './fieldSchema.ts';
import { errorIssue, type Issue, isRecord } from './issue.ts';
import { refusalCode } from './refusalCode.ts';

/** What the catalogue refuses in a record, field by field, and a missing or empty id where it needs one. */
export function shapeIssues(owner: FieldOwner, record: unknown, needsId: boolean): Issue[] {
  const issues = refusals(recordSchema(owner), record).map(({ path, message }) => {
    const value = valueAt(record, path);
    return errorIssue(refusalCode(owner, path, value), path, value, message);
  });
  if (needsId && isRecord(record) && (typeof record.id !== 'string' || record.id === '')) {
    const code = record.id === undefined ? 'missing' : 'type';
    issues.unshift(
      errorIssue(
        code,
        ['id'],
        record.id,
        'the id is missing or no text; allowed is any text that is not empty',
      ),
    );
  }
  return issues;
}

/** Keys of a record that the catalogue does not know. */
export function unknownKeys(owner: FieldOwner, record: unknown, also: readonly string[]): string[] {
  if (!isRecord(record)) return [];
  const known = new Set([...fieldsOf(owner).map((field) => field.key), ...also]);
  return Object.keys(record).filter((key) => !known.has(key));
}
