/** The kind of job that puts an archive together. */
export const EXPORT_JOB = 'account-export';

/** For how long an archive can be fetched. */
export const EXPORT_KEPT_MS = 24 * 60 * 60_000;

/** How far an export has come. */
export type ExportProgress =
  | { readonly state: 'waiting' }
  | { readonly state: 'at-work'; readonly done: number; readonly total: number }
  | { readonly state: 'ready'; readonly archive: string; readonly until: Date }
  | { readonly state: 'over' }
  | { readonly state: 'failed' };
