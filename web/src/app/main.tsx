import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import '../styles/index.css';
import { Providers } from './providers';

const root = document.getElementById('app');
if (!root) throw new Error('The page has no place for the app');

createRoot(root).render(
  <StrictMode>
    <Providers />
  </StrictMode>,
);
