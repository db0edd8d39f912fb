const NARROW = /[\s .,·:;|!'’ilIjtf()[\]/]/;
const WIDE = /[mwMWΩ%∠×√@—]/;

/**
 * Width of a line of text, estimated from the letter classes of a humanist sans in its bolder cut.
 * Layout must run without a page, so it cannot measure; the estimate errs on the wide side.
 */
export function textWidth(text: string, fontSize: number): number {
  let em = 0;
  for (const letter of text) em += NARROW.test(letter) ? 0.29 : WIDE.test(letter) ? 0.86 : 0.56;
  return em * fontSize;
}
