// Standing at a corner of the spread: the choice, and the line that says so.

export { CornerLine } from './corner-line.tsx';
export { StandGroup } from './stand-group.tsx';
