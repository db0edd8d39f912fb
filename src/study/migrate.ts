import type { Finding } from './types.ts';
import { errorIssue, findingOf, isRecord, valueText } from './validate/issue.ts';

/** The study format this programme writes. */
const currentVersion = 1;

interface Migrated {
  study: Record<string, unknown> | null;
  findings: Finding[];
}

type Step = (study: Record<string, unknown>) => Record<string, unknown>;

/** Steps from each older version to the next; version 1 is the first, so there is none yet. */
const steps: ReadonlyMap<number, Step> = new Map();

function refuse(code: string, key: string | null, value: unknown, text: string): Migrated {
  const path = key === null ? [] : [key];
  return { study: null, findings: [findingOf(errorIssue(code, path, value, text), '', [])] };
}

/** Brings older data to the present version. Foreign data and newer versions are refused in words. */
export function migrate(value: unknown): Migrated {
  if (!isRecord(value))
    return refuse('format', null, value, `the file holds ${valueText(value)}; allowed is a study record`);
  if (value.format !== 'varwright-study') {
    return refuse(
      'format',
      'format',
      value.format,
      `the format is ${valueText(value.format)}; allowed is "varwright-study"`,
    );
  }
  const { version } = value;
  if (typeof version !== 'number' || !Number.isInteger(version) || version < 1) {
    return refuse(
      'version',
      'version',
      version,
      `the version is ${valueText(version)}; allowed is ${currentVersion}`,
    );
  }
  if (version > currentVersion) {
    return refuse(
      'version',
      'version',
      version,
      `the file has version ${version}, newer than the ${currentVersion} this programme reads; open it with a newer programme`,
    );
  }
  let study = value;
  for (let at = version; at < currentVersion; at += 1) study = steps.get(at)?.(study) ?? study;
  return { study, findings: [] };
}
