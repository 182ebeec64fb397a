import type { ReactElement } from 'react';

/** Sent along, unseen. */
export function HiddenFields({ values }: { readonly values: Readonly<Record<string, string>> }): ReactElement {
  return (
    <>
      {Object.entries(values).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
    </>
  );
}
