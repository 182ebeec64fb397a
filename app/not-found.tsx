import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { RegionSearch } from '@/components/site/region-search';
import { PageHeading } from '@/components/ui/page-heading';
import { PageTitle } from '@/components/ui/page-title';
import broken from '@/content/messages/en/broken.json';

export const metadata: Metadata = { title: { absolute: broken.gone.titleOf } };

export default function NotFound(): ReactElement {
  return (
    <div className="max-w-text">
      <PageTitle title={broken.gone.titleOf} />
      <PageHeading>{broken.gone.title}</PageHeading>
      <p className="mt-4">{broken.gone.lead}</p>
      <div className="mt-8">
        <RegionSearch />
      </div>
      <ul className="mt-6" role="list">
        <li className="py-1">
          <a href="/regions">{broken.regions}</a>
        </li>
        <li className="py-1">
          <a href="/">{broken.home}</a>
        </li>
        <li className="py-1">
          <a href="/contact">{broken.help}</a>
        </li>
      </ul>
    </div>
  );
}
