import { useEffect, useState, type RefObject } from 'react';
import { dropCopy, readCopy, type DeviceCopy } from './device-copy';
import { sameValues, valuesOf } from './send-entry';

type Place = { readonly id: string; readonly item: string; readonly version: number; readonly state: number };

/** A copy on this device that says something else than the page, and that no sending of the form has made old. */
export function useCopy(
  here: RefObject<HTMLDivElement | null>,
  { id, item, version, state }: Place,
): readonly [DeviceCopy | null, (copy: DeviceCopy | null) => void] {
  const [copy, setCopy] = useState<DeviceCopy | null>(null);
  useEffect(() => {
    let isGone = false;
    void readCopy(id, item).then((found) => {
      if (isGone || found === null) return;
      if (isOld(found, { version, state, form: here.current?.closest('form') ?? null })) dropCopy(id, item);
      else setCopy(found);
    });
    return () => {
      isGone = true;
    };
  }, [here, id, item, version, state]);
  return [copy, setCopy];
}

type Shown = { readonly version: number; readonly state: number; readonly form: HTMLFormElement | null };

/** It arrived with its form, or says what the page says. */
function isOld(copy: DeviceCopy, { version, state, form }: Shown): boolean {
  const hasMovedOn = copy.version !== version || copy.state !== state;
  return (copy.isSent && hasMovedOn) || (form !== null && sameValues(copy.values, valuesOf(form)));
}
