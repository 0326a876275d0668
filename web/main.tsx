import './lib/zod-without-eval';
import './styles/main.css';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { App } from './app/app';
import { reportFault } from './lib/problem';

const root = document.getElementById('root');
if (!root) throw new Error('index.html has no element with the id "root".');

createRoot(root, {
  onCaughtError: reportFault,
}).render(
  <StrictMode>
    <App />
  </StrictMode>,
);
