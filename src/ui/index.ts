// The page.

export { App } from './app.tsx';
