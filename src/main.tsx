// Entry of the page.

import { render } from 'solid-js/web';
import { App } from './ui/index.ts';

const root = document.getElementById('app');
if (!root) throw new Error('index.html has no element #app');
render(() => <App />, root);
