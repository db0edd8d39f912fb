import type { PartPlace } from '../layout/index.ts';
import { partSubject } from '../subject.ts';

/** The two ends of a selected series part, over the bars they touch, to be dragged to other busbars. */
export function EndHandles({ place }: { place: PartPlace }) {
  return (
    <g data-subject={partSubject(place.id)}>
      {place.ends.map((end) => {
        const touch = end.path[0];
        return touch ? (
          <g key={end.bus} data-end={end.bus}>
            <circle className="hit" cx={touch.x} cy={touch.y} r={12} />
            <circle className="handle" cx={touch.x} cy={touch.y} r={6} />
            <title>Drag this end to another busbar</title>
          </g>
        ) : null;
      })}
    </g>
  );
}
