import type { Metadata, Viewport } from 'next';
import localFont from 'next/font/local';
import { cookies, headers } from 'next/headers';
import { connection } from 'next/server';
import type { ReactElement, ReactNode } from 'react';
import { SiteFooter } from '@/components/site/site-footer';
import { SiteHeader } from '@/components/site/site-header';
import { isTheme, type Theme } from '@/components/site/theme-choice';
import { FocusOnArrival } from '@/components/ui/focus-on-arrival';
import { words } from '@/lib/kernel/words';
import { currentSession } from '@/lib/server/session';
import { signOut } from './(account)/actions';
import { chooseTheme } from './theme';
import './styles/scripts.css';
import './globals.css';

const literata = localFont({
  src: '../node_modules/@fontsource-variable/literata/files/literata-latin-wght-normal.woff2',
  weight: '200 900',
  display: 'swap',
  variable: '--font-literata',
  adjustFontFallback: 'Times New Roman',
});

const atkinson = localFont({
  src: '../node_modules/@fontsource-variable/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-wght-normal.woff2',
  weight: '200 800',
  display: 'swap',
  variable: '--font-atkinson',
  adjustFontFallback: 'Arial',
});

export const metadata: Metadata = {
  title: { default: words('site.name'), template: words('site.titleOf', { page: '%s' }) },
  description: words('site.description'),
  formatDetection: { telephone: false, date: false, address: false, email: false },
};

/** The slip of each theme, for the frame that some browsers draw round a page. */
const SLIP = { light: '#f2f4f1', dark: '#141817' };

async function keptTheme(): Promise<Theme> {
  const kept = (await cookies()).get('theme')?.value;
  return isTheme(kept) ? kept : 'system';
}

export async function generateViewport(): Promise<Viewport> {
  const theme = await keptTheme();
  if (theme !== 'system') return { colorScheme: theme, themeColor: SLIP[theme] };
  const themeColor = (['light', 'dark'] as const).map((name) => ({ media: `(prefers-color-scheme: ${name})`, color: SLIP[name] }));
  return { colorScheme: 'light dark', themeColor };
}

export default async function RootLayout({ children }: { readonly children: ReactNode }): Promise<ReactElement> {
  // Every page is drawn on request, also one nobody finds: only then does it carry a nonce.
  await connection();
  const theme = await keptTheme();
  const path = (await headers()).get('x-path') ?? '';
  return (
    <html lang="en" className={`${literata.variable} ${atkinson.variable}`} {...(theme === 'system' ? {} : { 'data-theme': theme })}>
      <body>
        <a className="skip-link" href="#content">
          {words('site.skip')}
        </a>
        <SiteHeader path={path} who={await currentSession()} signOut={signOut} />
        <main id="content" tabIndex={-1} className="page">
          {children}
        </main>
        <SiteFooter path={path} theme={theme} chooseTheme={chooseTheme} />
        <FocusOnArrival />
      </body>
    </html>
  );
}
