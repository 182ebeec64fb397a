import 'server-only';
import { err, ok, type Result } from '@/lib/kernel/result';
import { log } from '../log';

/** `store-full`: there is no room left. `store-down`: it does not answer, or not as it should. */
export type StoreRefusal = { readonly kind: 'store-full' } | { readonly kind: 'store-down' };

/** The store could not do what it was asked. */
export class StoreFault extends Error {
  constructor(
    readonly kind: StoreRefusal['kind'],
    options: ErrorOptions = {},
  ) {
    super(`The file store failed: ${kind}`, options);
    this.name = 'StoreFault';
  }
}

const FULL: ReadonlySet<string> = new Set(['ENOSPC', 'EDQUOT', 'EFBIG']);

/** The fault that an error of the file system stands for; any other error is thrown on as it is. */
export function diskFaultOf(error: unknown): StoreFault {
  if (error instanceof StoreFault) return error;
  if (!(error instanceof Error) || !('syscall' in error) || !('code' in error)) throw error;
  return new StoreFault(typeof error.code === 'string' && FULL.has(error.code) ? 'store-full' : 'store-down', { cause: error });
}

/** Runs what touches the store; a fault of it is logged and becomes a refusal. */
export async function storing<T>(doing: string, work: () => Promise<T>): Promise<Result<T, StoreRefusal>> {
  try {
    return ok(await work());
  } catch (error) {
    if (!(error instanceof StoreFault)) throw error;
    log.error({ doing, error });
    return err({ kind: error.kind });
  }
}
