import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { App } from './app/app.tsx';
import { preloadFirstPage } from './app/router.tsx';
import { applyTheme } from './lib/theme.ts';
import { keepScreens } from './lib/keep-screens.ts';
import './styles/main.css';

applyTheme();
keepScreens();
preloadFirstPage();
const root = document.getElementById('root');
if (root) {
  createRoot(root).render(
    <StrictMode>
      <App />
    </StrictMode>,
  );
}
