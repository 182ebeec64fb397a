'use client';

import { useEffect, useMemo, useState, type ReactElement } from 'react';
import useSWR from 'swr';
import { makeSuggester, type Suggestion, type SuggestionIndex } from '@/lib/search/domain/suggestion';

type Props = { readonly field: HTMLInputElement };

const INDEX = '/api/v1/search-index';

/** Fails quietly: without suggestions the form still sends what was written. */
async function fetchIndex(address: string): Promise<SuggestionIndex> {
  const answer = await fetch(address);
  if (!answer.ok) throw new Error(`${address} answered ${answer.status}`);
  const index: unknown = await answer.json();
  if (!isIndex(index)) throw new Error(`${address} is no index`);
  return index;
}

// Our own site's answer, of one release or the next: enough to know whether it has entries at all.
const isIndex = (value: unknown): value is SuggestionIndex =>
  typeof value === 'object' &&
  value !== null &&
  'entries' in value &&
  Array.isArray(value.entries) &&
  'kinds' in value &&
  'counts' in value;

/** The list of a combobox after the ARIA practices: focus stays in the field, arrow keys read the list, Escape puts it away. */
export function Suggestions({ field }: Props): ReactElement | null {
  const { data } = useSWR<SuggestionIndex, Error>(INDEX, fetchIndex, { revalidateOnFocus: false, shouldRetryOnError: false });
  const suggest = useMemo(() => (data === undefined ? null : makeSuggester(data)), [data]);
  const { text, isOpen, active, put } = useField(field);
  const found = useMemo(() => (suggest === null || !isOpen ? [] : suggest(text)), [suggest, isOpen, text]);
  const list = `${field.id}-list`;
  useCombobox(field, { list, found, active, put });
  if (data === undefined) return null;
  return (
    <>
      <ul id={list} role="listbox" aria-label={data.label} className="suggestions" hidden={found.length === 0}>
        {found.map(({ address, title, kind }, place) => (
          <li
            key={address}
            id={`${list}-${place}`}
            role="option"
            aria-selected={place === active}
            onMouseDown={(event) => {
              event.preventDefault();
              window.location.assign(address);
            }}
          >
            <span>{title}</span> <span className="suggestion-kind">{data.kinds[kind]}</span>
          </li>
        ))}
      </ul>
      <p role="status" className="sr-only">
        {isOpen && text.trim().length > 1 ? (data.counts[found.length] ?? '') : ''}
      </p>
    </>
  );
}

type Written = { readonly text: string; readonly isOpen: boolean; readonly active: number };
type Field = Written & { readonly put: (change: Partial<Written>) => void };

/** What is written in the field, whether the list is open, and which line of it is read; -1 for none. */
function useField(field: HTMLInputElement): Field {
  const [written, setWritten] = useState<Written>({ text: field.value, isOpen: false, active: -1 });
  useEffect(() => {
    const onInput = (): void => {
      setWritten({ text: field.value, isOpen: true, active: -1 });
    };
    const onBlur = (): void => {
      setWritten((now) => ({ ...now, isOpen: false, active: -1 }));
    };
    field.addEventListener('input', onInput);
    field.addEventListener('blur', onBlur);
    // Written before the list was there.
    if (field.value !== field.defaultValue && document.activeElement === field) onInput();
    return () => {
      field.removeEventListener('input', onInput);
      field.removeEventListener('blur', onBlur);
    };
  }, [field]);
  const put = (change: Partial<Written>): void => {
    setWritten((now) => ({ ...now, ...change }));
  };
  return { ...written, put };
}

type Listed = Pick<Field, 'active' | 'put'> & { readonly list: string; readonly found: readonly Suggestion[] };

/** Roles and states of the field, and its keys. */
function useCombobox(field: HTMLInputElement, { list, found, active, put }: Listed): void {
  useEffect(() => {
    field.setAttribute('role', 'combobox');
    field.setAttribute('aria-autocomplete', 'list');
    field.setAttribute('aria-controls', list);
    field.setAttribute('aria-expanded', String(found.length > 0));
    if (active < 0) field.removeAttribute('aria-activedescendant');
    else field.setAttribute('aria-activedescendant', `${list}-${active}`);
  }, [field, list, found, active]);
  useEffect(() => {
    const onKey = (event: KeyboardEvent): void => {
      const act = actOf(event.key, { found, active, put });
      if (act === null) return;
      event.preventDefault();
      act();
    };
    field.addEventListener('keydown', onKey);
    return () => {
      field.removeEventListener('keydown', onKey);
    };
  });
}

/** What a key does to the list; null where the key is the field's own. */
function actOf(key: string, { found, active, put }: Omit<Listed, 'list'>): (() => void) | null {
  if (found.length === 0) return null;
  const chosen = found[active];
  if (key === 'Escape') {
    return () => {
      put({ isOpen: false, active: -1 });
    };
  }
  if (key === 'Enter' && chosen !== undefined) {
    return () => {
      window.location.assign(chosen.address);
    };
  }
  const next = placeAfter(key, active, found.length);
  return next === null
    ? null
    : () => {
        put({ active: next });
      };
}

/** The line that a key leads to, round and round with the field itself between; null for other keys. */
function placeAfter(key: string, active: number, count: number): number | null {
  if (key === 'ArrowDown') return active + 1 === count ? -1 : active + 1;
  if (key === 'ArrowUp') return active === -1 ? count - 1 : active - 1;
  return null;
}
