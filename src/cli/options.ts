import { parseArgs } from 'node:util';

export interface Options {
  file: string;
  /** Where the results file goes; absent: none is written. */
  out?: string;
  strict: boolean;
}

export const helpText = `Solves a study and prints a summary.

  npm run --silent study -- FILE.json [--out results.json] [--strict]

  FILE.json        the study to solve
  --out FILE       write the results file as well
  --strict         a verdict that fails, or is unknown for want of data, is an error too
  --help           show this text

Exit status: 0 solved; 1 a case did not converge (with --strict also: a verdict fails or is unknown);
2 bad input or options: every finding is on the error output and no file is written; 3 the programme
itself failed.

The answers rest on the data of the study. Local codes and a licensed engineer decide.
`;

/** The options, or "help", or why they cannot be meant. */
export function readOptions(args: readonly string[]): Options | 'help' | { problem: string } {
  try {
    const { values, positionals } = parseArgs({
      args: [...args],
      allowPositionals: true,
      options: {
        out: { type: 'string', short: 'o' },
        strict: { type: 'boolean', default: false },
        help: { type: 'boolean', short: 'h', default: false },
      },
    });
    if (values.help) return 'help';
    const [file, ...more] = positionals;
    if (file === undefined) return { problem: 'no study file is named' };
    if (more.length > 0) return { problem: `one study file at a time; also named: ${more.join(', ')}` };
    if (values.out === '') return { problem: '--out names no file' };
    return { file, strict: values.strict, ...(values.out === undefined ? {} : { out: values.out }) };
  } catch (error) {
    return { problem: error instanceof Error ? error.message : String(error) };
  }
}
