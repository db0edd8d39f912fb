import type { Finding } from '../study/index.ts';

/** One line a finding: severity, where, what. Errors first. */
export function findingLines(findings: readonly Finding[]): string[] {
  const errors = findings.filter(({ severity }) => severity === 'error');
  const warnings = findings.filter(({ severity }) => severity === 'warning');
  return [...errors, ...warnings].map(({ severity, path, message }) => `  ${severity}  ${path}  ${message}`);
}
