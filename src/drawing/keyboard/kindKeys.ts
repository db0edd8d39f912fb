import { type TrayKind, trayNames } from '../gestures/TrayKind.ts';

/** The letter that adds a kind to the busbar in focus: one of its name's own, its initial where that is free. */
export const kindKeys: Readonly<Record<TrayKind, string>> = {
  supply: 'S',
  generator: 'G',
  transformer: 'T',
  cable: 'C',
  reactor: 'R',
  coupler: 'O',
  motor: 'M',
  converter: 'D',
  load: 'L',
  bank: 'B',
  filter: 'F',
  branch: 'E',
  shunt: 'N',
  bus: 'U',
};

const kinds = new Map(Object.entries(kindKeys).map(([kind, key]) => [key, kind as TrayKind]));

/** The kind a key adds; on a keyboard of another script the letter that stands at its place in Latin. */
export function kindOfKey({ key, code }: { key: string; code: string }): TrayKind | undefined {
  const latin = /^[a-z]$/i.test(key) ? key : key.length === 1 ? /^Key([A-Z])$/.exec(code)?.[1] : undefined;
  return latin ? kinds.get(latin.toUpperCase()) : undefined;
}

/** A kind's name around its letter: "c", "o", "upler". */
export function aroundKey(kind: TrayKind, name = trayNames[kind]): [string, string, string] {
  const at = name.toLowerCase().indexOf(kindKeys[kind].toLowerCase());
  return at < 0 ? [name, '', ''] : [name.slice(0, at), name.charAt(at), name.slice(at + 1)];
}
