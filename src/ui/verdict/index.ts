// The verdict line.

export { VerdictLine } from './verdict-line.tsx';
