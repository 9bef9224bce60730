import '@fontsource/lato/400.css';
import '@fontsource/lato/700.css';
import './shared/theme/page.css';
import { StrictMode, type ReactNode } from 'react';
import { createRoot } from 'react-dom/client';
import { RouterProvider } from 'react-router-dom';
import { AppProviders } from './app/providers.js';
import { HydrateFallback } from './app/root.js';
import { createAppRouter } from './app/router.js';
import { createQueryClient } from './shared/api/query-client.js';

const root = document.getElementById('root');
if (root === null) throw new Error('index.html has no element with the id "root"');

const queryClient = createQueryClient();
const page = createRoot(root);

function show(content: ReactNode) {
  page.render(
    <StrictMode>
      <AppProviders queryClient={queryClient}>{content}</AppProviders>
    </StrictMode>,
  );
}

show(<HydrateFallback />);
show(<RouterProvider router={await createAppRouter()} />);
