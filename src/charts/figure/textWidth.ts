/** Advance widths in em by letter class, taken from the semibold cut of the page's sans. */
const CLASSES: readonly { letters: RegExp; em: number }[] = [
  { letters: /[\s .,·:;|!'’ilIj]/, em: 0.28 },
  { letters: /[()[\]/°rtf]/, em: 0.37 },
  { letters: /[mwMW%∠√@—✕]/, em: 0.88 },
  { letters: /[A-ZΩΣ]/, em: 0.68 },
];
const OTHER_EM = 0.54;

/**
 * Width of a line of text, estimated from letter classes. Layout runs without a page, so it cannot measure;
 * the estimate errs a little on the wide side.
 */
export function textWidth(text: string, fontSize: number): number {
  let em = 0;
  for (const letter of text) em += CLASSES.find((one) => one.letters.test(letter))?.em ?? OTHER_EM;
  return em * fontSize;
}
