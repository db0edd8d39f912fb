import { useEffect } from 'react';
import { useStore } from 'zustand';
import { openFromRecent, recentStudies, recentWords, refreshRecent } from './recentStudies.ts';
import './files.css';

const onPaper = 3;

/** The studies last worked on, on the paper of an empty one. */
export function Recent() {
  const documents = useStore(recentStudies, (state) => state.documents);
  useEffect(() => void refreshRecent(), []);
  if (documents.length === 0) return null;
  return (
    <section className="beginnings" aria-label="Recent studies">
      <h2>Go on with a recent study</h2>
      {documents.slice(0, onPaper).map((document) => (
        <button key={document.documentId} type="button" onClick={() => openFromRecent(document)}>
          <strong>{document.title}</strong>
          <span>{recentWords(document)}</span>
        </button>
      ))}
    </section>
  );
}
