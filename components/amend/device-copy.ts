import { isValues, type Values } from './send-entry';

/** What was typed on this device and may not have reached the server. */
export type DeviceCopy = {
  readonly values: Values;
  /** Of the entry it was typed over, and of the amendment then. */
  readonly version: number;
  readonly state: number;
  /** The form was sent with it: if it arrived, the amendment or the entry has moved on. */
  readonly isSent: boolean;
};

const nameOf = (id: string, item: string): string => `amendment-copy ${id} ${item}`;

/** Done now or never: a device that keeps nothing is no reason to stop. */
const quietly = <T>(work: () => T): Promise<T | null> =>
  Promise.resolve()
    .then(work)
    .then(
      (value) => value,
      () => null,
    );

export const putCopy = (id: string, item: string, copy: DeviceCopy): void => {
  void quietly(() => {
    window.localStorage.setItem(nameOf(id, item), JSON.stringify(copy));
  });
};

export const dropCopy = (id: string, item: string): void => {
  void quietly(() => {
    window.localStorage.removeItem(nameOf(id, item));
  });
};

/** Marks the copy as sent with its form. */
export async function markSent(id: string, item: string): Promise<void> {
  const copy = await readCopy(id, item);
  if (copy !== null) putCopy(id, item, { ...copy, isSent: true });
}

export const readCopy = (id: string, item: string): Promise<DeviceCopy | null> =>
  quietly(() => {
    const copy: unknown = JSON.parse(window.localStorage.getItem(nameOf(id, item)) ?? 'null');
    return isCopy(copy) ? copy : null;
  });

const isCopy = (copy: unknown): copy is DeviceCopy =>
  typeof copy === 'object' &&
  copy !== null &&
  'values' in copy &&
  copy.values !== null &&
  isValues(copy.values) &&
  'version' in copy &&
  'state' in copy &&
  'isSent' in copy;
