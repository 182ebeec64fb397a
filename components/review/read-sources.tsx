import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';
import type { ClaimToRead } from '@/lib/regions/domain/amendment-view';
import { claimAnchor } from './anchors';

type Props = {
  readonly claims: readonly ClaimToRead[];
  /** Address of the page on which they are read and ticked. */
  readonly page: string;
};

/** Which sources a moderator has read, and which are still to be read: each leads back to its place. */
export function ReadSources({ claims, page }: Props): ReactElement {
  const unread = claims.filter(({ isRead }) => !isRead);
  const read = claims.filter(({ isRead }) => isRead);
  return (
    <>
      {unread.length === 0 ? null : <Sources title={words('review.approve.unread')} claims={unread} page={page} />}
      <Sources title={words('review.approve.read')} claims={read} page={page} />
    </>
  );
}

function Sources({ title, claims, page }: Props & { readonly title: string }): ReactElement {
  return (
    <>
      <h2 className="mt-8">{title}</h2>
      {claims.length === 0 ? <p className="mt-2">{words('review.approve.noSource')}</p> : null}
      <ul className="mt-3 flex list-disc flex-col gap-2 ps-6">
        {claims.map(({ key, title: claim, source, citation: { locator } }) => (
          <li key={key} className="wrap-anywhere">
            <a href={`${page}#${claimAnchor(key)}`}>{claim}</a>:{' '}
            <cite>{locator === undefined ? source.title : words('editions.cited', { title: source.title, locator })}</cite>
          </li>
        ))}
      </ul>
    </>
  );
}
