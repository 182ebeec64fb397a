import 'server-only';
import { makeExport } from '@/lib/accounts/make-export';
import type { JobHandler } from './job-handler';

/** What is done for each kind of job. A slice adds a line: `'accounts.export': exportAccount`. */
export const HANDLERS: Readonly<Record<string, JobHandler>> = {
  'account-export': makeExport,
};
