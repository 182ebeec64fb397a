import { Fragment, type ReactElement } from 'react';
import { payloadLines, type PayloadLine } from '@/lib/regions/domain/payload-lines';
import type { ToldPayload } from '@/lib/regions/domain/told-rule';
import { MemoryMark } from './strength-line';

/** The details of a rule by name: figure, exact words, fields of a paper. Nothing at all where the rule has none. */
export function PayloadDetails({ payload }: { readonly payload: ToldPayload }): ReactElement | null {
  const lines = payloadLines(payload);
  if (lines.length === 0) return null;
  return (
    <dl className="definitions">
      {lines.map((line) => (
        <div key={line.name}>
          <dt>{line.name}</dt>
          <dd className="font-sans text-plain">
            <PayloadDetail line={line} />
            {'fromMemory' in line ? (
              <>
                {' '}
                <MemoryMark />
              </>
            ) : null}
          </dd>
        </div>
      ))}
    </dl>
  );
}

/** The words of one detail. */
export function PayloadDetail({ line }: { readonly line: PayloadLine }): ReactElement {
  switch (line.kind) {
    case 'text':
      return <>{line.text}</>;
    case 'texts':
      return (
        <ul className={line.texts.length > 1 ? 'list-disc ps-6' : undefined}>
          {line.texts.map((text) => (
            <li key={text}>{text}</li>
          ))}
        </ul>
      );
    case 'quotes':
      return (
        <ul className="flex flex-col gap-2">
          {line.quotes.map(({ lang, language, text }) => (
            <li key={lang}>
              <p className="text-umber">{language}</p>
              <q lang={lang}>
                <Lines text={text} />
              </q>
            </li>
          ))}
        </ul>
      );
    case 'link':
      return <a href={line.href}>{line.href}</a>;
  }
}

/** Words that the source sets in several lines keep them. */
function Lines({ text }: { readonly text: string }): ReactElement {
  return (
    <>
      {text.split('\n').map((part, place) => (
        <Fragment key={place}>
          {place === 0 ? null : <br />}
          {part}
        </Fragment>
      ))}
    </>
  );
}
