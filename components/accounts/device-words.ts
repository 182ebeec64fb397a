import { words } from '@/lib/kernel/words';

const BROWSERS = [
  ['firefox', /firefox|fxios/i],
  ['edge', /edg(e|a|ios)?\//i],
  ['opera', /opr\/|opera/i],
  ['chrome', /chrom(e|ium)|crios/i],
  ['safari', /safari/i],
] as const;

const SYSTEMS = [
  ['android', /android/i],
  ['ios', /iphone|ipad|ipod/i],
  ['windows', /windows/i],
  ['mac', /mac os|macintosh/i],
  ['linux', /linux|x11|cros/i],
] as const;

/** "Firefox on Linux", out of what a browser says it is: enough to know one's own devices apart. */
export function deviceWords(agent: string): string {
  const [browser = 'other'] = BROWSERS.find(([, mark]) => mark.test(agent)) ?? [];
  const [system = 'other'] = SYSTEMS.find(([, mark]) => mark.test(agent)) ?? [];
  return words('accounts.session.on', {
    browser: words(`accounts.session.browser.${browser}`),
    system: words(`accounts.session.system.${system}`),
  });
}
