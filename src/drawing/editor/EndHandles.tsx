import type { PartPlace } from '../layout/index.ts';
import { partSubject } from '../subject.ts';

/** The two ends of a selected series part, over the bars they touch, to be dragged to other busbars. */
export function EndHandles({ place }: { place: PartPlace }) {
  return (
    <g data-subject={partSubject(place.id)}>
      {place.ends.map((end) => {
        const touch = end.path[0];
        return touch ? (
          <circle key={end.bus} className="handle" data-end={end.bus} cx={touch.x} cy={touch.y} r={6}>
            <title>drag this end to another busbar</title>
          </circle>
        ) : null;
      })}
    </g>
  );
}
