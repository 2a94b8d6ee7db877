// A worker thread cannot load .ts on Node 20 by itself: register tsx in it, then go on in TypeScript.
import { register } from 'tsx/esm/api';
register();
await import('./learningWorker.ts');
