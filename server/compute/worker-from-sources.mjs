// In development and in the specs a thread reads TypeScript as the main thread does; what is built needs none of this.
import { register } from 'tsx/esm/api';

register();
await import('./worker.ts');
