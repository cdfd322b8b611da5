import { StrictMode, Suspense } from 'react';
import { createRoot } from 'react-dom/client';
import './app/base.css';
import { Providers } from './app/providers.js';
import { Router } from './app/router.js';

const root = document.getElementById('root');
if (!root) throw new Error('index.html has no element with the id "root".');

createRoot(root).render(
  <StrictMode>
    <Providers>
      <Suspense>
        <Router />
      </Suspense>
    </Providers>
  </StrictMode>,
);
