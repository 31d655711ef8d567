// A thread gets no loader from its process, so it starts one for itself before the first TypeScript file.
import { register } from 'tsx/esm/api';

register();
await import('./answer-thread.ts');
