import type { Instrumentation } from 'next';

/** Runs once as the server starts. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME === 'nodejs') {
    const { readEnv } = await import('./lib/server/env');
    const { notePeers } = await import('./lib/server/note-peers');
    const { sayErrorPages } = await import('./lib/server/say-error-pages');
    readEnv(); // A fault in the settings shows now, not at the first reader.
    notePeers();
    sayErrorPages();
  }
}

/** The digest logged here is the number that error.tsx shows. */
export const onRequestError: Instrumentation.onRequestError = async (error, request, context) => {
  if (process.env.NEXT_RUNTIME === 'nodejs') {
    const { log } = await import('./lib/server/log');
    log.error({ id: digestOf(error), error, method: request.method, route: context.routePath, during: context.routeType });
  }
};

function digestOf(error: unknown): string | null {
  return typeof error === 'object' && error !== null && 'digest' in error && typeof error.digest === 'string' ? error.digest : null;
}
