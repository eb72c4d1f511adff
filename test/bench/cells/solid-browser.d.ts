// The reactive build of the signals, which Node would pass over for the one that renders on a server.

declare module 'solid-js/dist/solid.js' {
  export { createMemo, createRoot, createSignal } from 'solid-js';
}
