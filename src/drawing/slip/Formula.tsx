import { Fragment } from 'react';

/** Formula text with its indices set low: "u_k" and "P_EC-R" as the trade writes them. */
export function Formula({ text }: { text: string }) {
  return text.split(/(_[A-Za-z0-9]+(?:-R)?)/).map((part, index) => {
    const key = `${index} ${part}`;
    return part.startsWith('_') ? (
      <sub key={key}>{part.slice(1)}</sub>
    ) : (
      <Fragment key={key}>{part}</Fragment>
    );
  });
}
