import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { PageHeading } from '@/components/ui/page-heading';
import broken from '@/content/messages/en/broken.json';

export const metadata: Metadata = { title: { absolute: broken.titleOf }, robots: { index: false } };

type Props = { readonly searchParams: Promise<Readonly<Record<string, string | string[] | undefined>>> };

/** Only a number of ours is shown back, never what else somebody put into an address. */
const numberIn = (id: unknown): string | null => (typeof id === 'string' && /^[0-9a-f-]{6,40}$/.test(id) ? id : null);

/** Where a form ends that broke, or that came from elsewhere, when no script is there to draw error.tsx. */
export default async function BrokenPage({ searchParams }: Props): Promise<ReactElement> {
  const { why, id } = await searchParams;
  const foreign = why === 'origin';
  const number = numberIn(id);
  return (
    <div className="max-w-text">
      <PageHeading takesFocus>{foreign ? broken.origin.title : broken.title}</PageHeading>
      <p className="mt-4">{foreign ? broken.origin.lead : broken.lead}</p>
      {foreign || number === null ? null : (
        <>
          <p className="mt-3">{broken.mend}</p>
          <p className="mt-3 font-sans">{number}</p>
        </>
      )}
      <p className="mt-6 flex flex-wrap gap-6">
        <a href="/">{broken.home}</a>
        <a href="/contact">{broken.help}</a>
      </p>
    </div>
  );
}
