import '@fontsource/nunito-sans/latin-400.css';
import '@fontsource/nunito-sans/latin-600.css';
import '@fontsource/nunito-sans/latin-700.css';
import '@fontsource/nunito-sans/latin-800.css';
import '@fontsource/nunito-sans/latin-ext-400.css';
import '@fontsource/nunito-sans/latin-ext-600.css';
import '@fontsource/nunito-sans/latin-ext-700.css';
import './app/app.css';
import { setNonce } from 'get-nonce';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { RouterProvider } from 'react-router-dom';
import { Providers } from './app/providers.tsx';
import { createRouter } from './app/router.tsx';
import { setFormWords } from './lib/form-words.ts';

const root = document.getElementById('root');
if (!root) throw new Error('index.html has no element with the id "root".');

setFormWords();

// Dialogs write a style sheet that keeps the page from scrolling behind them; the page's own nonce lets it pass the server's policy.
setNonce(document.querySelector<HTMLMetaElement>('meta[property=csp-nonce]')?.nonce ?? '');

createRoot(root).render(
  <StrictMode>
    <Providers>
      <RouterProvider router={createRouter()} />
    </Providers>
  </StrictMode>,
);
