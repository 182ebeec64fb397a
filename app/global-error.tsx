'use client';

import type { ReactElement } from 'react';
import broken from '@/content/messages/en/broken.json';
import './globals.css';

/** Only when the shell itself broke: it cannot rest on anything of the shell. */
export default function GlobalError(): ReactElement {
  return (
    <html lang="en">
      <body>
        <title>{broken.titleOf}</title>
        <main className="page">
          <h1>{broken.title}</h1>
          <p className="mt-4">{broken.lead}</p>
          <p className="mt-6 flex flex-wrap gap-6">
            <a href="/">{broken.home}</a>
            <a href="/contact">{broken.help}</a>
          </p>
        </main>
      </body>
    </html>
  );
}
