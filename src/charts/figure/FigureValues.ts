/** The numbers of a figure as rows of cells, the head first: plain digits, so that a spreadsheet reads them. */
export type FigureValues = readonly (readonly string[])[];

/** A number for a spreadsheet: six significant digits, a full stop, no spaces; empty where there is none. */
export function cellOf(value: number | null | undefined): string {
  return value === null || value === undefined || !Number.isFinite(value)
    ? ''
    : String(Number(value.toPrecision(6)));
}
