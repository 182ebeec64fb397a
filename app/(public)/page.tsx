import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { SectionDrawing } from '@/components/pieces/section-drawing';
import { sectionWords } from '@/components/pieces/section-words';
import { RegionSearch } from '@/components/site/region-search';
import { LinkButton } from '@/components/ui/link-button';
import { PageHeading } from '@/components/ui/page-heading';
import { Panel } from '@/components/ui/panel';
import { words } from '@/lib/kernel/words';

export const metadata: Metadata = { title: { absolute: words('site.name') } };

const BOWL = { form: 'bowl', depthMm: 62, capacityMl: 680, inside: 'glazed', rimDecorated: true };
const GETS = ['list', 'source', 'gaps', 'ask'] as const;

export default function HomePage(): ReactElement {
  return (
    <>
      <div className="columns">
        <div className="main-part max-w-text">
          <PageHeading>{words('home.title')}</PageHeading>
          <p className="mt-6">{words('home.lead')}</p>
          <p className="mt-4">{words('home.honest')}</p>
          <p className="mt-8">
            <LinkButton href="/check">{words('home.check')}</LinkButton>
          </p>
          <p className="mt-3 font-sans text-plain text-umber">{words('home.without')}</p>
        </div>
        <figure className="home-drawing">
          <SectionDrawing {...BOWL} words={sectionWords(BOWL)} />
          <figcaption className="mt-3 font-sans text-small text-umber">{words('home.drawing.caption')}</figcaption>
        </figure>
      </div>
      <section className="mt-16" aria-labelledby="find">
        <h2 id="find">{words('home.find.title')}</h2>
        <div className="mt-4">
          <RegionSearch />
        </div>
        <ul className="mt-3 flex flex-wrap gap-x-6">
          <li>
            <a href="/regions">{words('home.find.all')}</a>
          </li>
          <li>
            <a href="/changes">{words('library.links.changes.name')}</a>
          </li>
          <li>
            <a href="/heard">{words('library.links.heard.name')}</a>
          </li>
        </ul>
      </section>
      <section className="mt-16" aria-labelledby="gets">
        <h2 id="gets">{words('home.gets.title')}</h2>
        <dl className="home-gets">
          {GETS.map((part) => (
            <div key={part}>
              <dt>{words(`home.gets.${part}.name`)}</dt>
              <dd>{words(`home.gets.${part}.text`)}</dd>
            </div>
          ))}
        </dl>
      </section>
      <div className="mt-12 max-w-text">
        <Panel colour="ash">
          <p>{words.rich('home.caution', { strong: (said) => <strong className="font-strong">{said}</strong> })}</p>
          <p className="mt-2">
            <a href="/cautions">{words('home.more')}</a>
          </p>
        </Panel>
      </div>
    </>
  );
}
