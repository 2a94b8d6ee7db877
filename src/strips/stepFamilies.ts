import type { StepFamily } from '#shared/grooming/types.ts';

/** How each family of steps is named and painted; the pattern tells what colour cannot. */
export const stepFamilies: readonly {
  family: StepFamily;
  words: string;
  letter: string;
  color: string;
  /** Letters on the fill: dark on pale, pale on dark. */
  letterColor: string;
}[] = [
  family('prep', 'prep', 'P', 'var(--fawn)', 'var(--ink)'),
  family('wash', 'wash', 'W', 'var(--mint)', 'var(--ink)'),
  family('dry', 'dry', 'D', 'var(--honey)', 'var(--ink)'),
  family('clip', 'clip', 'C', 'var(--collar)', '#fff'),
  family('scissor', 'scissor', 'S', 'var(--apricot)', 'var(--ink)'),
  family('wrap', 'wrap-up', 'U', 'var(--liver)', '#fff'),
];

const byFamily = new Map(stepFamilies.map((one) => [one.family, one]));

export function stepFamily(key: StepFamily) {
  return byFamily.get(key)!;
}

function family(
  key: StepFamily,
  words: string,
  letter: string,
  color: string,
  letterColor: string,
) {
  return { family: key, words, letter, color, letterColor };
}
