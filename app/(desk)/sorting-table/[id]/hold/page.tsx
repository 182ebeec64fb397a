import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import type { Query } from '@/app/(account)/form-words';
import { words } from '@/lib/kernel/words';
import { hold } from '../../actions';
import { reasonPage } from '../../reason-page';

type Props = { readonly params: Promise<{ readonly id: string }>; readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('review.hold.heading'), robots: { index: false } };

export default async function HoldPage(props: Props): Promise<ReactElement> {
  return reasonPage(props, { page: 'hold', act: 'hold', action: hold });
}
