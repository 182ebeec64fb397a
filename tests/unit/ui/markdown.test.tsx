import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, test } from 'vitest';
import { renderMarkdown } from '@/lib/server/markdown';

function html(source: string): string {
  const drawn = renderMarkdown(source);
  return drawn.ok ? renderToStaticMarkup(drawn.value) : drawn.error.kind;
}

describe('what a writer may do', () => {
  test('headings begin below the page heading and skip no level', () => {
    const levels = [...html('# A\n\n### B\n\n##### C\n\n## D\n\n# E').matchAll(/<h(\d)/g)].map(([, level]) => Number(level));
    expect(levels).toEqual([2, 3, 4, 3, 2]);
  });

  test('a footnote leads to its note and back', () => {
    const text = html('A claim.[^1]\n\n[^1]: Its source.');
    for (const [, target = ''] of text.matchAll(/href="#([^"]+)"/g)) expect(text).toContain(`id="${target}"`);
    expect(text).toContain('href="#user-content-fn-1"');
  });

  test('a table keeps its roles, and each cell carries its column for narrow windows', () => {
    const text = html('| Part | mg/L |\n|---|--:|\n| rim | 2 |');
    expect(text).toContain(
      '<div class="scroll-area" role="region" aria-label="Table" tabindex="0"><table role="table" class="data-table">',
    );
    expect(text).toContain('<th role="columnheader" scope="col">Part</th>');
    expect(text).toContain('<td role="cell" class="numeric"><span class="cell-label" aria-hidden="true">mg/L: </span>2</td>');
  });

  test('a task list says in words what is done', () => {
    const text = html('- [x] fired\n- [ ] tested');
    expect(text).toContain('Done: fired');
    expect(text).toContain('Open: tested');
    expect(text).not.toContain('<input');
  });

  test.each(['https://example.test/a', 'http://example.test', 'mailto:a@example.test', '/regions/dk', '/regions/dk#limits'])(
    'a link to %s is a link',
    (address) => {
      expect(html(`[here](${address})`)).toContain(`href="${address}"`);
    },
  );

  test('a link to another site gives no credit and no way back', () => {
    expect(html('[here](https://example.test)')).toContain('rel="nofollow ugc noopener"');
    expect(html('[here](/regions)')).not.toContain('rel=');
  });
});

describe('what a writer may not do', () => {
  test.each([
    'javascript:alert(1)',
    'JaVaScRiPt:alert(1)',
    '&#106;avascript:alert(1)',
    'vbscript:x',
    'data:text/html,x',
    'file:///etc/passwd',
    '//evil.test',
    'regions/dk',
    'https:evil.test',
  ])('a link to %s stays as its words', (address) => {
    const text = html(`[here](<${address}>)`);
    expect(text).toContain('here');
    expect(text).not.toContain('href=');
  });

  test.each([
    '<script>alert(1)</script>',
    '<img src=x onerror=alert(1)>',
    '<svg onload=alert(1)>',
    '<iframe srcdoc="<script>1</script>">',
    '<style>*{display:none}</style>',
    '<form action="https://evil.test"><input name=password></form>',
    '<a href="javascript:alert(1)">x</a>',
    'text <b onclick="x()">bold</b>',
    '<math><mtext></form><form><mglyph><style></math><img src onerror=alert(1)>',
  ])('raw HTML such as %s is left out', (source) => {
    expect(html(source)).not.toMatch(/<(script|img|svg|iframe|style|form|input|math|b)\b|on\w+=|javascript:/i);
  });

  test('pictures, which would be fetched from elsewhere, are left out', () => {
    expect(html('![a pot](https://example.test/pot.png) and [![x](a.png)](/notes)')).not.toContain('<img');
  });

  test('braces and expressions are plain text', () => {
    expect(html('{1+1} ${process.env.HOME} export const a = 1')).toContain('{1+1} ${process.env.HOME} export const a = 1');
  });

  test('more than 50 kB is refused, counted in bytes', () => {
    expect(html('a'.repeat(50_000))).not.toBe('too-long');
    expect(html('a'.repeat(50_001))).toBe('too-long');
    expect(html('ø'.repeat(25_001))).toBe('too-long');
  });

  test.each([
    ['quotes', '>'.repeat(49_000)],
    ['quotes with spaces', '> '.repeat(24_000)],
    ['lists', '- '.repeat(24_000)],
    ['numbered lists', '1. '.repeat(16_000)],
    ['lists ever further in', Array.from({ length: 290 }, (_, depth) => `${' '.repeat(depth)}- a`).join('\n')],
  ])('%s in each other by the thousand are refused at once', (_name, source) => {
    const begun = performance.now();
    expect(html(source)).toBe('too-tangled');
    expect(performance.now() - begun).toBeLessThan(1000);
  });

  test('quotes and lists as people nest them are fine', () => {
    expect(html('> > - a\n> >   1. b\n\n- - c')).toContain('<blockquote>');
  });
});
