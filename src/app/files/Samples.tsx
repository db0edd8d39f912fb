import './files.css';
import { leaveStudy } from './leaveStudy.ts';
import { openSample } from './openSample.ts';
import { samples } from './samples.ts';

/** The sample sites by their story, on the paper of an empty study. */
export function Samples() {
  return (
    <section className="beginnings" aria-label="Sample sites">
      <h2>Or begin with a site that tells a story</h2>
      {samples.map((sample) => (
        <button key={sample.id} type="button" onClick={() => leaveStudy(() => void openSample(sample))}>
          <strong>{sample.title}</strong>
          <span>{sample.story}</span>
        </button>
      ))}
    </section>
  );
}
