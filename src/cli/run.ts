import { readFile } from 'node:fs/promises';
import type { Finding, Study } from '../study/index.ts';
import { FileError } from './FileError.ts';
import { findingLines } from './findingLines.ts';
import { helpText, type Options, readOptions } from './options.ts';
import { outputProblem, writeAtomically } from './outputFile.ts';

export interface Output {
  out(text: string): void;
  err(text: string): void;
}

const solved = 0;
const notGood = 1;
const badInput = 2;
const programmeFault = 3;

/** The whole command: what to exit with. Engine and checks are loaded once there is something to solve. */
export async function run(args: readonly string[], output: Output): Promise<number> {
  const options = readOptions(args);
  if (options === 'help') {
    output.out(helpText);
    return solved;
  }
  if ('problem' in options) return refuse(output, `${options.problem}. --help shows how to call it.`);
  try {
    return await solve(options, output);
  } catch (error) {
    if (error instanceof FileError) return refuse(output, error.message);
    const fault = error instanceof Error ? (error.stack ?? error.message) : String(error);
    output.err(`varwright: the programme itself failed; nothing can be said of the study.\n${fault}\n`);
    return programmeFault;
  }
}

function refuse(output: Output, reason: string): number {
  output.err(`varwright: ${reason}\n`);
  return badInput;
}

async function solve(options: Options, output: Output): Promise<number> {
  const { file, out, strict } = options;
  const problem = out === undefined ? null : await outputProblem(out, file);
  if (problem !== null) return refuse(output, problem);
  const text = await textOf(file);
  const { readStudy } = await import('../study/index.ts');
  const { study, findings } = readStudy(text);
  if (!study) return refuseStudy(output, file, findings);
  return report(study, findings, { ...(out === undefined ? {} : { out }), strict }, output);
}

async function textOf(file: string): Promise<string> {
  try {
    return await readFile(file, 'utf8');
  } catch (error) {
    throw new FileError(`${file} cannot be read`, error);
  }
}

function refuseStudy(output: Output, file: string, findings: readonly Finding[]): number {
  const errors = findings.filter(({ severity }) => severity === 'error').length;
  output.err(`varwright: ${file} is refused: ${errors} error${errors === 1 ? '' : 's'}.\n`);
  output.err(`${findingLines(findings).join('\n')}\n`);
  return badInput;
}

async function report(
  study: Study,
  findings: readonly Finding[],
  { out, strict }: { out?: string; strict: boolean },
  output: Output,
): Promise<number> {
  const [{ solveAll }, { summary }] = await Promise.all([import('./solveAll.ts'), import('./summary.ts')]);
  const { results, verdicts } = solveAll(study);
  if (out !== undefined) await writeAtomically(out, `${JSON.stringify(results)}\n`);
  output.out(`${summary(study, results, verdicts, findings).join('\n')}\n`);
  const converged = results.cases.every((solvedCase) => solvedCase.converged);
  const open = [...verdicts.values()]
    .flat()
    .some(({ verdict }) => verdict === 'fail' || verdict === 'unknown');
  return converged && !(strict && open) ? solved : notGood;
}
