import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { App } from './app/app';
import { createRouter } from './app/router';
import './shared/theme/fonts.css';
import './shared/theme/base.css';

createRoot(document.getElementById('root')!).render(
  <StrictMode>
    <App router={createRouter()} />
  </StrictMode>,
);
