import { evaluateDay } from '#shared/schedule/evaluateDay.ts';

/** What the browser's page calls; bundled by `tests/e2e/golden.test.ts`. */
Object.assign(globalThis, { evaluateDay });
