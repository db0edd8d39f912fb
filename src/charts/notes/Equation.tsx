/** Splits into text and subscripts in turn. */
const SUBSCRIPT = /_([\p{L}\p{N}]+)/u;

/** An equation with its subscripts set low, as the trade writes "I_rms / I_N"; the text is never markup. */
export function Equation({ text }: { text: string }) {
  return text.split(SUBSCRIPT).map((piece, at) => {
    const key = `${at} ${piece}`;
    return at % 2 === 1 ? <sub key={key}>{piece}</sub> : <span key={key}>{piece}</span>;
  });
}
