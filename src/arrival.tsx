import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { ArrivalPage } from './features/arrival/ArrivalPage.tsx';
import { readGivenArrival } from './features/arrival/readGivenArrival.ts';
import './styles.css';
import './features/arrival/said.css';

// Its own entry: React and nothing else, so that it opens fast from a text on any phone.
createRoot(document.getElementById('root')!).render(
  <StrictMode>
    <ArrivalPage token={location.pathname.split('/').at(-1) ?? ''} given={readGivenArrival()} />
  </StrictMode>,
);
