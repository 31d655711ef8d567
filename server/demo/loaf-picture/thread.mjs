// A thread does not take over its parent's loader of TypeScript everywhere, so it brings its own.
import { register } from 'tsx/esm/api';

register();
await import('./worker.ts');
