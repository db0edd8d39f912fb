import { randomBytes } from 'node:crypto';
import { access, constants, realpath, rename, rm, stat, writeFile } from 'node:fs/promises';
import { basename, dirname, join, resolve } from 'node:path';
import { FileError } from './FileError.ts';

/** Why a results file cannot be written there, as far as can be told before there is one; null where it can. */
export async function outputProblem(out: string, input: string): Promise<string | null> {
  try {
    await access(dirname(resolve(out)), constants.W_OK);
  } catch {
    return `${out} cannot be written: its folder is missing or not writable`;
  }
  const existing = await stat(out).catch(() => null);
  if (existing?.isDirectory()) return `${out} cannot be written: it is a folder`;
  if (existing && (await sameFile(out, input)))
    return `${out} is the study itself; name another results file`;
  return null;
}

async function sameFile(a: string, b: string): Promise<boolean> {
  const [first, second] = await Promise.all([realpath(a), realpath(b).catch(() => null)]);
  return first === second;
}

/** Writes beside the file and renames, so that a file is there whole or as it was before. */
export async function writeAtomically(path: string, text: string): Promise<void> {
  const part = join(dirname(resolve(path)), `.${basename(path)}.${randomBytes(4).toString('hex')}.part`);
  try {
    await writeFile(part, text, { flag: 'wx' });
    await rename(part, path);
  } catch (error) {
    await rm(part, { force: true });
    throw new FileError(`${path} cannot be written`, error);
  }
}
