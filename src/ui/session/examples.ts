// The worked sheets that come with the program; the first opens at the first visit.

import crevasse from '../../../public/examples/crevasse-listener.txt?raw';
import pickups from '../../../public/examples/lute-pickups.txt?raw';
import weir from '../../../public/examples/weir-gauge.txt?raw';

interface Example {
  readonly title: string;
  readonly text: string;
}

/** In the order of the shelf. */
export const EXAMPLES: readonly Example[] = [crevasse, weir, pickups].map((text) => ({
  text,
  title: /^# (.*)$/m.exec(text)?.[1] ?? 'Example',
}));
