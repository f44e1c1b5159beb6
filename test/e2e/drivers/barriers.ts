import AxeBuilder from '@axe-core/playwright';
import type { Page } from '../browser.ts';

/** What axe-core finds at rest, in words that name the rule and the place. */
export async function findBarriers(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  return violations.flatMap(({ id, nodes }) =>
    nodes.map((node) => `${id}: ${node.target.join(' ')}`),
  );
}
