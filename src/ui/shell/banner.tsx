// Lines over the sheet that want a decision or say how the sheet came here.

import { For, Match, Show, Switch } from 'solid-js';
import type { JSX } from 'solid-js';
import type { Session } from '../session/index.ts';

interface Choice {
  readonly title: string;
  readonly run: () => void;
}

/** Whatever there is to say: a link that could not be opened, a received copy, the worked example, trouble with keeping. */
export function Banners(props: {
  readonly session: Session;
  readonly openShelf: () => void;
  readonly saveFile: () => void;
}) {
  const { session } = props;
  const trouble = () => {
    const state = session.keepState();
    return state.state === 'not kept' ? state : null;
  };
  const elsewhere = () => {
    const state = session.keepState();
    return state.state === 'elsewhere' ? state : null;
  };
  return (
    <>
      <Show when={session.linkFault()}>
        {(fault) => (
          <Banner urgent choices={[{ title: 'Close', run: () => session.dismissLinkFault() }]}>
            {fault().text}
          </Banner>
        )}
      </Show>
      <Show when={trouble()}>
        {(state) => (
          <Banner urgent choices={[{ title: 'Save as a file', run: () => props.saveFile() }]}>
            {state().reason}
          </Banner>
        )}
      </Show>
      <Show when={elsewhere()}>
        {(state) => (
          <Banner
            urgent
            choices={[
              { title: 'Take theirs', run: () => void session.takeTheirs() },
              { title: 'Keep mine', run: () => void session.keepMine() },
              { title: 'Save mine as a file', run: () => props.saveFile() },
            ]}
          >
            {state().reason}
          </Banner>
        )}
      </Show>
      <Switch>
        <Match when={session.origin() === 'received'}>
          <Banner
            choices={[
              { title: 'Keep it on my shelf', run: () => void session.keepNow() },
              { title: 'Shelf', run: () => props.openShelf() },
            ]}
          >
            This sheet came in a link. It is a copy: nothing of yours was overwritten, and it is kept here only when you
            change it or keep it.
          </Banner>
        </Match>
        <Match when={session.origin() === 'example'}>
          <Banner
            choices={[
              { title: 'Start an empty sheet', run: () => void session.openText('', 'new') },
              { title: 'Shelf', run: () => props.openShelf() },
            ]}
          >
            This is a worked example, yours to change.
          </Banner>
        </Match>
      </Switch>
    </>
  );
}

function Banner(props: {
  readonly urgent?: true;
  readonly choices: readonly Choice[];
  readonly children: JSX.Element;
}) {
  return (
    <section class="banner" aria-label="Notice" classList={{ urgent: props.urgent === true }}>
      <p role={props.urgent ? 'alert' : undefined}>{props.children}</p>
      <For each={props.choices}>
        {(choice) => (
          <button type="button" onClick={() => choice.run()}>
            {choice.title}
          </button>
        )}
      </For>
    </section>
  );
}
