export interface JsonFault {
  /** Both counted from 1. */
  line: number;
  column: number;
  /** What stands there, or "end of file". */
  found: string;
}

// Built from parts because a control character may not stand in a regular expression literal.
const space = String.raw`[ \t\n\r]*`;
const mark = String.raw`([{}[\],:])`;
const quoted = String.raw`("(?:[^"\\\u0000-\u001f]|\\(?:["\\/bfnrt]|u[0-9a-fA-F]{4}))*")`;
const literal = String.raw`(-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?|true|false|null)(?![\w.+-])`;
const token = new RegExp(`${space}(?:${mark}|${quoted}|${literal})`, 'y');

/**
 * Where a text stops being JSON (RFC 8259), or null where it is JSON. The host's own message is not used:
 * engines word and place it differently.
 */
export function jsonFault(text: string): JsonFault | null {
  const open: ('{' | '[')[] = [];
  let expect: 'value' | 'key' | 'keyOrEnd' | 'valueOrEnd' | 'colon' | 'comma' | 'end' = 'value';
  token.lastIndex = 0;
  while (expect !== 'end') {
    const start = skipSpace(text, token.lastIndex);
    token.lastIndex = start;
    const match = token.exec(text);
    if (!match) return faultAt(text, start);
    const next = advance(expect, match[1], match[2] !== undefined, open);
    if (next === null) return faultAt(text, start);
    expect = next;
  }
  const rest = skipSpace(text, token.lastIndex);
  return rest < text.length ? faultAt(text, rest) : null;
}

type Expectation = 'value' | 'key' | 'keyOrEnd' | 'valueOrEnd' | 'colon' | 'comma' | 'end';

function advance(
  expect: Expectation,
  mark: string | undefined,
  isText: boolean,
  open: ('{' | '[')[],
): Expectation | null {
  const afterValue = (): Expectation => (open.length === 0 ? 'end' : 'comma');
  if (expect === 'colon') return mark === ':' ? 'value' : null;
  if (expect === 'key' || expect === 'keyOrEnd') {
    if (isText) return 'colon';
    if (expect === 'key' || mark !== '}') return null;
    open.pop();
    return afterValue();
  }
  if (expect === 'comma') {
    const inside = open.at(-1);
    if (mark === ',') return inside === '{' ? 'key' : 'value';
    if (mark !== (inside === '{' ? '}' : ']')) return null;
    open.pop();
    return afterValue();
  }
  if (mark === '{' || mark === '[') {
    open.push(mark);
    return mark === '{' ? 'keyOrEnd' : 'valueOrEnd';
  }
  if (mark === ']' && expect === 'valueOrEnd') {
    open.pop();
    return afterValue();
  }
  return mark === undefined ? afterValue() : null;
}

function skipSpace(text: string, from: number): number {
  let at = from;
  while (at < text.length && ' \t\n\r'.includes(text.charAt(at))) at += 1;
  return at;
}

function faultAt(text: string, offset: number): JsonFault {
  const before = text.slice(0, offset);
  const line = before.split('\n').length;
  const column = offset - before.lastIndexOf('\n');
  const found =
    offset >= text.length
      ? 'the end of the file'
      : JSON.stringify(text.slice(offset, offset + 12).split('\n')[0]);
  return { line, column, found };
}
