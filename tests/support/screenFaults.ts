import axe from 'axe-core';
import type { Page } from 'playwright-core';

/**
 * What is wrong with a screen as it stands, in lines to read: wider than its window, or an axe-core
 * violation of WCAG 2 A or AA that is serious or critical. Empty when all is well.
 */
export async function screenFaults(page: Page): Promise<string[]> {
  const window = page.viewportSize()!.width;
  const width = await page.evaluate(() => document.documentElement.scrollWidth);
  const wide = width > window ? [`scrolls sideways: ${width} px in ${window}`] : [];
  return [...wide, ...(await axeFaults(page))];
}

async function axeFaults(page: Page): Promise<string[]> {
  // Evaluated, not added as a script element: the page's content policy stays as it is.
  await page.evaluate(axe.source);
  const violations = await page.evaluate(async () => {
    const { axe: here } = globalThis as unknown as { axe: typeof axe };
    const found = await here.run(document, {
      runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa'],
      resultTypes: ['violations'],
    });
    return found.violations.map(({ id, impact, nodes }) => ({
      id,
      impact,
      nodes: nodes.map((node) => `${node.target.join(' ')}: ${node.failureSummary ?? ''}`),
    }));
  });
  return violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .map(({ id, nodes }) => `${id} at ${nodes.slice(0, 4).join(' | ')}`);
}
