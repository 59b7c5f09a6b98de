import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import './app/app.css';
import { App } from './app/app.tsx';
import { showTheme, storedTheme } from './lib/theme.ts';

showTheme(storedTheme());

const root = document.getElementById('root');
if (root === null) throw new Error('the page has no place for the application');
createRoot(root).render(
  <StrictMode>
    <App />
  </StrictMode>,
);
