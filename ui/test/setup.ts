import '@testing-library/jest-dom/vitest';
import { configure } from '@testing-library/dom';

class ResizeObserverStub {
  observe() {}
  unobserve() {}
  disconnect() {}
}
globalThis.ResizeObserver ??= ResizeObserverStub as unknown as typeof ResizeObserver;

// Fluent's focus handling at times marks an open dialog aria-hidden in jsdom; real visibility is checked in the browser.
configure({ defaultHidden: true, asyncUtilTimeout: 5000 });

// jsdom has no media queries: tests see a wide screen with the light theme.
globalThis.matchMedia ??= ((query: string) => ({
  matches: false,
  media: query,
  addEventListener: () => undefined,
  removeEventListener: () => undefined,
})) as unknown as typeof globalThis.matchMedia;
