import type { Finding } from '../types.ts';

export type PathStep = string | number;

/** Something wrong or worth saying about one record, with a path relative to that record. */
export interface Issue {
  code: string;
  severity: Finding['severity'];
  path: readonly PathStep[];
  value: unknown;
  /** A clause without the record's name and without a full stop. */
  text: string;
  /** Every top-level field that takes part, so that a case's change can be blamed. */
  keys?: readonly string[];
}

export function errorIssue(
  code: string,
  path: readonly PathStep[],
  value: unknown,
  text: string,
  keys?: readonly string[],
): Issue {
  return { code, severity: 'error', path, value, text, ...(keys ? { keys } : {}) };
}

export function warningIssue(
  code: string,
  path: readonly PathStep[],
  value: unknown,
  text: string,
  keys?: readonly string[],
): Issue {
  return { code, severity: 'warning', path, value, text, ...(keys ? { keys } : {}) };
}

/** JSON path: $.elements[3].ukPercent; a key that is no identifier stands in brackets. */
function jsonPath(steps: readonly PathStep[]): string {
  return steps.reduce<string>((path, step) => {
    if (typeof step === 'number') return `${path}[${step}]`;
    return /^[A-Za-z_$][\w$]*$/.test(step) ? `${path}.${step}` : `${path}[${JSON.stringify(step)}]`;
  }, '$');
}

const longestValue = 80;

/** The value as JSON text, cut to a readable length; "absent" where there is none. */
export function valueText(value: unknown): string {
  if (value === undefined) return 'absent';
  if (typeof value === 'number') return String(value);
  const json = jsonText(value);
  return json.length > longestValue ? `${json.slice(0, longestValue - 1)}…` : json;
}

/** Data nested thousands deep overflow the stack of any writer; they are named, not shown. */
function jsonText(value: unknown): string {
  try {
    return JSON.stringify(value) ?? typeof value;
  } catch {
    return 'data that cannot be written';
  }
}

/** Places an issue in the study: `where` names the record in words, `at` is its path. */
export function findingOf(issue: Issue, where: string, at: readonly PathStep[]): Finding {
  const sentence = where
    ? `${where}: ${issue.text}.`
    : `${issue.text.charAt(0).toUpperCase()}${issue.text.slice(1)}.`;
  return {
    code: issue.code,
    severity: issue.severity,
    path: jsonPath([...at, ...issue.path]),
    value: valueText(issue.value),
    message: sentence,
  };
}

export function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
