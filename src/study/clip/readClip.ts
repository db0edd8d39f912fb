import { busesOf, isSeries } from '../lookup.ts';
import { nameOf } from '../names.ts';
import type { Finding, Study } from '../types.ts';
import { checkStudy } from '../validate/checkStudy.ts';
import { isRecord } from '../validate/issue.ts';
import type { PartsClip } from './PartsClip.ts';

export type ClipOutcome =
  | { ok: true; clip: PartsClip }
  /** `foreign`: the text never was a copy of parts. */
  | { ok: false; foreign: boolean; words: string };

/** Text longer than this many characters is no copy of parts; reading it would only freeze the page. */
const longestText = 8_000_000;

/** Reads the text of a clipboard. Anything but sound parts is refused in words. Never throws. */
export function readClip(text: string): ClipOutcome {
  const value = text.length > longestText ? undefined : jsonOf(text);
  if (!isRecord(value) || value.format !== 'varwright-parts') return foreign(text, value);
  if (value.version !== 1)
    return refused(`they were copied by another version of Varwright (version ${String(value.version)})`);
  const { study, findings } = checkStudy(value.study);
  if (!study) return refused(firstError(findings));
  const { hangsFrom, caseValues } = value;
  if (!isIdList(hangsFrom, study)) return refused('the busbars they hung from are not among them');
  const { buses, elements } = study;
  const loose = elements.find(
    (part) => isSeries(part) && busesOf(part).every((bus) => hangsFrom.includes(bus)),
  );
  if (loose) return refused(`both ends of ${nameOf(loose)} would be at one busbar`);
  if (elements.length === 0 && buses.length <= hangsFrom.length)
    return refused('there is no part among them');
  return {
    ok: true,
    clip: {
      format: 'varwright-parts',
      version: 1,
      study,
      hangsFrom,
      caseValues: typeof caseValues === 'number' && caseValues > 0 ? Math.floor(caseValues) : 0,
    },
  };
}

function jsonOf(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}

function refused(reason: string): ClipOutcome {
  return { ok: false, foreign: false, words: `The copied parts cannot be pasted: ${reason}` };
}

function firstError(findings: readonly Finding[]): string {
  const errors = findings.filter((finding) => finding.severity === 'error');
  const more = errors.length > 1 ? ` (and ${errors.length - 1} more)` : '';
  const message = errors[0]?.message ?? 'they are damaged';
  return `${message.replace(/\.$/, '')}${more}`;
}

function isIdList(value: unknown, study: Study): value is string[] {
  return Array.isArray(value) && value.every((id) => study.buses.some((bus) => bus.id === id));
}

function foreign(text: string, value: unknown): ClipOutcome {
  return { ok: false, foreign: true, words: foreignWords(text, value) };
}

function foreignWords(text: string, value: unknown): string {
  if (text.trim() === '') return 'The clipboard holds no text to paste';
  if (isRecord(value) && value.format === 'varwright-study')
    return 'The clipboard holds a whole study; open it as a file to work on it';
  if (/^\s*\{\s*"format"\s*:\s*"varwright-parts"/.test(text))
    return 'The copied parts cannot be pasted: their text is cut off or damaged';
  if (text.includes('\t')) return 'The clipboard holds a table; it belongs into a table of parts or rows';
  return 'The clipboard holds no parts; copy some on a drawing first';
}
