// The page around the panes.

export { Shell } from './shell.tsx';
