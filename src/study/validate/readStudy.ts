import { checkStudy, type ReadOutcome } from './checkStudy.ts';
import { jsonFault } from './jsonFault.ts';

/**
 * Reads a study file. Text that is no JSON gives one finding with line and column, counted from 1; anything
 * else goes through checkStudy. A byte-order mark is skipped. Never throws.
 */
export function readStudy(text: string): ReadOutcome {
  const body = text.startsWith('\uFEFF') ? text.slice(1) : text;
  let value: unknown;
  try {
    value = JSON.parse(body);
  } catch {
    const fault = jsonFault(body);
    const place = fault ? `line ${fault.line}, column ${fault.column}` : 'an unknown place';
    const found = fault?.found ?? 'the text';
    return {
      study: null,
      findings: [
        {
          code: 'json',
          severity: 'error',
          path: '$',
          value: found,
          message: `The file is no JSON: ${found} stands at ${place}. Correct it there or open another file.`,
        },
      ],
    };
  }
  return checkStudy(value);
}
