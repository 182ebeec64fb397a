import type { Instrumentation } from 'next';

/** Runs once as the server starts. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME === 'nodejs') {
    const { demandEnv } = await import('./lib/server/env');
    const { notePeers } = await import('./lib/server/note-peers');
    const { sayErrorPages } = await import('./lib/server/say-error-pages');
    const { sayUnavailable } = await import('./lib/server/say-unavailable');
    const { logConsole } = await import('./lib/server/log-console');
    demandEnv(); // A fault in the settings shows now, not at the first reader.
    notePeers();
    sayErrorPages();
    sayUnavailable();
    logConsole();
  }
}

/** The digest logged here is the number that error.tsx shows. */
export const onRequestError: Instrumentation.onRequestError = async (error, request, context) => {
  if (process.env.NEXT_RUNTIME === 'nodejs') {
    const { noteUnavailable } = await import('./lib/server/say-unavailable');
    noteUnavailable(error); // before the first byte of the answer leaves
    const { log } = await import('./lib/server/log');
    log.error({ id: digestOf(error), error, method: request.method, route: context.routePath, during: context.routeType });
  }
};

function digestOf(error: unknown): string | null {
  return typeof error === 'object' && error !== null && 'digest' in error && typeof error.digest === 'string' ? error.digest : null;
}
