import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { createDesk } from './state/createDesk.ts';
import './styles/theme.css';
import './styles/base.css';
import './styles/page.css';
import './styles/notices.css';
import './styles/sentence.css';
import './styles/popover.css';
import './styles/results.css';
import './styles/drawings.css';
import './styles/points.css';
import './styles/print.css';
import { ErrorBoundary } from './views/page/ErrorBoundary.tsx';
import { Page } from './views/page/Page.tsx';
import { AnalysisClient } from './worker/analysisClient.ts';
import { startAnalysisWorker } from './worker/startAnalysisWorker.ts';

const root = document.getElementById('root');
if (root === null) throw new Error('The page has no element for the application.');
const desk = createDesk(new AnalysisClient(startAnalysisWorker));
// The first paint shows a run, so that nobody meets an empty page.
void desk.openSample(0);
createRoot(root).render(
  <StrictMode>
    <ErrorBoundary>
      <Page desk={desk} />
    </ErrorBoundary>
  </StrictMode>,
);
