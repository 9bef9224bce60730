import { cleanup, configure } from '@testing-library/react';
import { afterEach, vi } from 'vitest';
import '@testing-library/jest-dom/vitest';

/** What the simulated browser lacks and the app uses. */
function addMissing() {
  window.matchMedia = (query) =>
    Object.assign(new EventTarget(), {
      matches: false,
      media: query,
      onchange: null,
      addListener: () => undefined,
      removeListener: () => undefined,
    });
  window.ResizeObserver = class {
    observe() {}
    unobserve() {}
    disconnect() {}
  };
  // Without layout everything looks invisible, and Fluent finds nothing to focus in a dialog.
  Object.defineProperty(HTMLElement.prototype, 'offsetParent', {
    configurable: true,
    get(this: HTMLElement) {
      return this.parentElement;
    },
  });
  document.body.getBoundingClientRect = () => new DOMRect(0, 0, 1280, 800);
  window.scrollTo = () => undefined;
  Element.prototype.scrollIntoView = () => undefined;
}

addMissing();
configure({ asyncUtilTimeout: 10_000 });
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  localStorage.clear();
});
