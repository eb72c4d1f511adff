// The line that takes the verdict's place while the page stands at a corner of its spread.

import type { Desk } from '../desk/index.ts';
import type { Corner } from '../spread/index.ts';
import { Prose } from '../typeset/index.ts';
import './corner.css';

/** Says which corner, and leads back. */
export function CornerLine(props: { readonly desk: Desk; readonly corner: Corner }) {
  return (
    <div class="corner-line" role="status" aria-label="Standing at a corner">
      <p>
        <strong>
          <Prose text={`Standing at the ${props.corner.name}`} />
        </strong>
        {': '}
        <Prose text={`${props.corner.words}. Entries stay as they are; numbers are those of this corner.`} />
      </p>
      <button type="button" onClick={() => props.desk.stand(null)}>
        Back to nominal <kbd>Esc</kbd>
      </button>
    </div>
  );
}
