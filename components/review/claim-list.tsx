import type { ReactElement, ReactNode } from 'react';
import { SourceTitle } from '@/components/regions/source-details';
import { MemoryMark } from '@/components/regions/strength-line';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { ClaimToRead } from '@/lib/regions/domain/amendment-view';
import { claimAnchor } from './anchors';
import { ReadCount } from './read-count';
import { sayBytes } from './say-bytes';

type Props = {
  readonly claims: readonly ClaimToRead[];
  /** The tick of a claim, for whoever decides. */
  readonly tick: ((claim: ClaimToRead) => ReactNode) | null;
  /** Remarks on a claim. */
  readonly below: (claim: ClaimToRead) => ReactNode;
};

/** Each claim beside the passage it rests on; one below the other, the claim first, where there is no room. */
export function ClaimList({ claims, tick, below }: Props): ReactElement {
  if (claims.length === 0) return <p className="mt-2">{words('review.claims.none')}</p>;
  const total = claims.length;
  return (
    <>
      <p className="mt-2 max-w-text">{words('review.claims.lead')}</p>
      {tick === null ? null : (
        <ReadCount
          read={claims.filter(({ isRead }) => isRead).length}
          says={Array.from({ length: total + 1 }, (_, read) => words('review.claims.count', { read, total }))}
        />
      )}
      {claims.map((claim) => (
        <section key={claim.key} id={claimAnchor(claim.key)} className="claim" aria-labelledby={`${claimAnchor(claim.key)}-title`}>
          <div className="claim-sides">
            <Said claim={claim} />
            <RestsOn claim={claim} />
          </div>
          {tick?.(claim)}
          {below(claim)}
        </section>
      ))}
    </>
  );
}

type ClaimProps = { readonly claim: ClaimToRead };

function Said({ claim: { key, title, says } }: ClaimProps): ReactElement {
  return (
    <div>
      <p className="claim-label">{words('review.claims.claim')}</p>
      <h3 id={`${claimAnchor(key)}-title`}>{title}</h3>
      <p className="mt-2 whitespace-pre-line wrap-anywhere">{says}</p>
    </div>
  );
}

function RestsOn({ claim }: ClaimProps): ReactElement {
  const { citation, source } = claim;
  const { passage, passageLang, locator } = citation;
  return (
    <div>
      <p className="claim-label">{words('review.claims.source')}</p>
      <p className="wrap-anywhere">
        <SourceTitle title={source.title} url={source.url} />
        {locator === undefined ? null : <>, {locator}</>}. <bdi>{source.publisher}</bdi>.
      </p>
      {passage === undefined ? (
        <p className="mt-2">{words(source.url === undefined ? 'review.claims.noPassageNoAddress' : 'review.claims.noPassage')}</p>
      ) : (
        <blockquote lang={passageLang} className="claim-passage">
          <p>{words('regions.source.passage', { passage })}</p>
        </blockquote>
      )}
      <Facts claim={claim} />
    </div>
  );
}

/** When and how the source was read, and what was kept of it. */
function Facts({ claim: { citation, source, fileId } }: ClaimProps): ReactElement {
  const { seenOn, seenVia, versionDate, identifier, fingerprint } = source;
  const facts: readonly (readonly [name: 'standing' | 'evidence' | 'seen' | 'version' | 'identifier' | 'kept', value: ReactNode])[] = [
    ['standing', words(`regions.source.${citation.standing}`)],
    ['evidence', citation.evidence === 'memory' ? <MemoryMark key="memory" /> : words('editions.evidence.read')],
    ['seen', seenOn === undefined ? words('review.claims.notSeen') : <time dateTime={seenOn}>{sayDate(seenOn)}</time>],
    ...(versionDate === undefined ? [] : [['version', versionDate] as const]),
    ...(identifier === undefined ? [] : [['identifier', <bdi key="id">{identifier}</bdi>] as const]),
    ['kept', <Kept key="kept" fileId={fileId} fingerprint={fingerprint} via={seenVia} />],
  ];
  return (
    <dl className="claim-facts">
      {facts.map(([name, value]) => (
        <div key={name}>
          <dt>{words(`review.claims.${name}`)}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  );
}

type KeptProps = {
  readonly fileId: string | null;
  readonly fingerprint: ClaimToRead['source']['fingerprint'];
  readonly via: string | undefined;
};

/** The page as its reader saw it. */
function Kept({ fileId, fingerprint, via }: KeptProps): ReactElement {
  return (
    <>
      {fingerprint === undefined ? words('review.claims.keptNone') : null}
      {fingerprint !== undefined && fileId !== null ? (
        <a href={`/api/files/${fileId}`}>{words('review.claims.keptFile', { size: sayBytes(fingerprint.bytes) })}</a>
      ) : null}
      {fingerprint === undefined ? null : (
        <span className="block">
          {words('review.claims.fingerprint')}: <code className="break-all text-small">{fingerprint.sha256}</code>
        </span>
      )}
      {via === undefined ? null : <span className="block wrap-anywhere">{words('review.claims.via', { copy: via })}</span>}
    </>
  );
}
