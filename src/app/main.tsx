import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { startWorkbench, workbench } from '../store/index.ts';
import { newStudy } from '../study/index.ts';
import { App } from './App.tsx';
import { openAddressedSample } from './files/openSample.ts';
import './theme/theme.css';
import '../charts/charts.css';
import '../drawing/drawing.css';
import '../drawing/marks/marks.css';
import '../drawing/hand.css';
import '../drawing/slip/slip.css';
import './app.css';

const root = document.getElementById('root');
if (!root) throw new Error('the page has no #root to draw into');

await startWorkbench();
// What was being worked on comes before a sample named in the address.
if ((workbench.getState().study?.elements.length ?? 0) === 0) await openAddressedSample();
if (!workbench.getState().study) {
  workbench.getState().openStudy(newStudy({ title: 'New study', frequencyHz: 50 }));
}
createRoot(root).render(
  <StrictMode>
    <App />
  </StrictMode>,
);
