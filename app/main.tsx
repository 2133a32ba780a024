import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';

const root = document.getElementById('root');
if (root === null) throw new Error('The page has no element for the application.');
createRoot(root).render(
  <StrictMode>
    <h1>Stepwell</h1>
  </StrictMode>,
);
