/** Diagonal strokes: what carries no voltage, or what is not yet computed. */
export function Hatch({ id, ink }: { id: string; ink: string }) {
  return (
    <defs>
      <pattern id={id} width={5} height={5} patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
        <line x1={0} y1={0} x2={0} y2={5} stroke={ink} strokeWidth={1.6} />
      </pattern>
    </defs>
  );
}
