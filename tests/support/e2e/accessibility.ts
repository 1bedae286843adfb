import { readFileSync } from 'node:fs';
import type { Page } from 'playwright-core';

const axeSource = readFileSync(require.resolve('axe-core/axe.min.js'), 'utf8');

interface AxeResults {
  violations: { id: string; help: string; nodes: { target: string[]; failureSummary?: string }[] }[];
}

/**
 * What axe finds wrong on the page now: WCAG 2.2 levels A and AA. One line per finding and element.
 * Axe is run by the debugger, past the page's content security policy.
 */
export async function accessibilityProblems(page: Page): Promise<string[]> {
  await page.evaluate(axeSource);
  const results = await page.evaluate<AxeResults>(
    "axe.run(document, { runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'] })",
  );
  return results.violations.flatMap((violation) =>
    violation.nodes.map((node) => `${violation.id}: ${violation.help}: ${node.target.join(' ')}`),
  );
}
