import AxeBuilder from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { EVERY_LOOK, WIDTHS } from './browser';

const TAGS = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'];

/** Rules whose outcome the colours decide; all others come out the same in both themes. */
export const COLOUR_RULES = ['color-contrast', 'link-in-text-block'];

/** What axe finds on the page as it stands: by every rule, or by those named. */
export async function axeFinds(page: Page, rules?: string[]): Promise<readonly unknown[]> {
  const axe = new AxeBuilder({ page });
  const { violations } = await (rules === undefined ? axe.withTags(TAGS) : axe.withRules(rules)).analyze();
  return violations.map(({ id, nodes }) => ({ id, at: nodes.slice(0, 3).map(({ target }) => target.join(' ')) }));
}

/**
 * What axe finds on these pages, and which of them scroll sideways, at every width and in both themes. `npm test` looks at the
 * narrowest width and at each page in one theme, in turns; two pages at a time.
 */
export async function faultsOf(open: (width: number) => Promise<Page>, paths: readonly string[]): Promise<readonly unknown[]> {
  const looks = WIDTHS.flatMap((width) =>
    paths.flatMap((path, at) => themesOf(at).map((colorScheme) => ({ width, path, colorScheme }) as const)),
  );
  const lane = async (): Promise<readonly unknown[]> => {
    const faults: unknown[] = [];
    const pages = new Map<number, Page>();
    for (let look = looks.shift(); look !== undefined; look = looks.shift()) {
      const page = pages.get(look.width) ?? (await open(look.width));
      pages.set(look.width, page);
      await page.emulateMedia({ colorScheme: look.colorScheme, reducedMotion: 'reduce' });
      await page.goto(look.path);
      faults.push(...(await axeFinds(page)).map((found) => ({ ...look, found })));
      const wider = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
      if (wider > 0) faults.push({ ...look, wider });
    }
    for (const page of pages.values()) await page.context().close();
    return faults;
  };
  return (await Promise.all([lane(), lane()])).flat();
}

const themesOf = (at: number): readonly ('light' | 'dark')[] => {
  if (EVERY_LOOK) return ['light', 'dark'];
  return at % 2 === 0 ? ['light'] : ['dark'];
};
