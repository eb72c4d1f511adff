// The whole page: a session with its sheet, shown as soon as one is open.

import { Show } from 'solid-js';
import { createSession } from './session/index.ts';
import { Shell } from './shell/index.ts';
import './theme.css';

/** The page. */
export function App() {
  const session = createSession(window);
  return (
    <Show when={session.ready()}>
      <Shell session={session} />
    </Show>
  );
}
