import type { ReactElement } from 'react';

export type Topic = { readonly id: string; readonly name: string; readonly state: 'done' | 'now' | 'later'; readonly href?: string };
type Props = {
  readonly label: string;
  readonly topics: readonly Topic[];
  /** The words for the states, read out after each name. */
  readonly words: Readonly<Record<Topic['state'], string>>;
};

const RING = { done: 5, now: 2.5, later: 1 } as const;

/** One throwing ring a topic: thick when done, with a dot where one is, thin when it is still to come. */
export function ProgressRings({ label, topics, words }: Props): ReactElement {
  return (
    <nav className="rings" aria-label={label}>
      <ol>
        {topics.map((topic) => (
          <li key={topic.id} aria-current={topic.state === 'now' ? 'step' : undefined}>
            <svg width="28" height="28" viewBox="0 0 28 28" aria-hidden="true" className="text-iron">
              <circle cx="14" cy="14" r="10" fill="none" stroke="currentColor" strokeWidth={RING[topic.state]} />
              {topic.state === 'now' ? <circle cx="14" cy="14" r="4" fill="currentColor" /> : null}
            </svg>
            <span>
              {topic.href === undefined ? topic.name : <a href={topic.href}>{topic.name}</a>}{' '}
              <span className="sm:sr-only">({words[topic.state]})</span>
            </span>
          </li>
        ))}
      </ol>
    </nav>
  );
}
