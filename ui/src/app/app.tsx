import { createDOMRenderer, FluentProvider, RendererProvider } from '@fluentui/react-components';
import { QueryClientProvider } from '@tanstack/react-query';
import { Suspense, useMemo } from 'react';
import { RouterProvider } from 'react-router-dom';
import { queryClient } from '../shared/api/query-client';
import { LoadingFigure } from '../shared/feedback/loading';
import { ColourModeProvider, useColourMode } from '../shared/theme/colour-mode';
import { themes } from '../shared/theme/themes';
import type { createRouter } from './router';

/** The policy allows only style elements that carry the nonce of this answer; the browser hides it from attributes. */
const nonceOfPage = () => document.querySelector<HTMLMetaElement>('meta[property="csp-nonce"]')?.nonce ?? '';

export function App({ router }: { router: ReturnType<typeof createRouter> }) {
  const renderer = useMemo(
    () => createDOMRenderer(document, { styleElementAttributes: { nonce: nonceOfPage() } }),
    [],
  );
  return (
    <RendererProvider renderer={renderer}>
      <ColourModeProvider>
        <QueryClientProvider client={queryClient}>
          <Themed router={router} />
        </QueryClientProvider>
      </ColourModeProvider>
    </RendererProvider>
  );
}

function Themed({ router }: { router: ReturnType<typeof createRouter> }) {
  const { mode } = useColourMode();
  return (
    <FluentProvider theme={themes[mode]} className="sl-root">
      <Suspense fallback={<LoadingFigure height={320} />}>
        <RouterProvider router={router} />
      </Suspense>
    </FluentProvider>
  );
}
