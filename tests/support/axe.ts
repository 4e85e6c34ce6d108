import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { Page } from 'playwright-core';

const source = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

interface Finding {
  readonly id: string;
  readonly nodes: readonly { readonly target: readonly unknown[]; readonly failureSummary?: string }[];
}

/** What axe-core finds against WCAG 2.2 A and AA on the page as it stands: a line a finding. */
export async function axeFindings(page: Page): Promise<string[]> {
  await page.evaluate(source);
  const violations = await page.evaluate(async () => {
    const axe = (globalThis as unknown as { axe: { run: (context: Document, options: object) => Promise<{ violations: Finding[] }> } }).axe;
    const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
    return (await axe.run(document, { runOnly: { type: 'tag', values: tags } })).violations;
  });
  return violations.flatMap(({ id, nodes }) =>
    nodes.map(({ target, failureSummary }) => `${id} at ${target.join(' ')}: ${failureSummary ?? ''}`),
  );
}
