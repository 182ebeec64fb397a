import type { ReactElement, ReactNode } from 'react';

const COLOURS = {
  plain: 'text-umber',
  celadon: 'text-celadon',
  ash: 'text-ash',
  copper: 'text-copper',
  cobalt: 'text-cobalt',
} as const;

type Props = { readonly colour?: keyof typeof COLOURS; readonly children: ReactNode };

/** A word or two in a frame. The word carries the meaning. */
export function Badge({ colour = 'plain', children }: Props): ReactElement {
  return <span className={`badge ${COLOURS[colour]}`}>{children}</span>;
}
