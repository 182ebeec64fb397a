'use client';

import { useEffect, useRef, useState, type ReactElement, type RefObject } from 'react';
import { dropCopy, markSent, putCopy } from './device-copy';
import { sameValues, sendEntry, valuesOf, type Standing, type Values } from './send-entry';
import { useCopy } from './use-copy';

export type KeepWords = Readonly<
  Record<
    'keeping' | 'kept' | 'failed' | 'signedOut' | 'moved' | 'gone' | 'theirs' | 'keepMine' | 'takeTheirs' | 'copy' | 'restore' | 'discard',
    string
  >
>;

type Props = {
  readonly id: string;
  readonly item: string;
  /** Of the entry, and of the amendment. */
  readonly version: number;
  readonly state: number;
  readonly said: KeepWords;
};

const WAIT_MS = 1500;
const RETRY_MS = 8000;
const TIME = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' });

type Status = { readonly kind: 'kept'; readonly at: string } | { readonly kind: 'keeping' | 'failed' | 'signedOut' } | null;

/** In a form: keeps what is typed on the server a moment after the last key, and on this device until the server has it. */
export function KeepEntry({ id, item, version, state, said }: Props): ReactElement {
  const here = useRef<HTMLDivElement>(null);
  const [status, setStatus] = useState<Status>(null);
  const [standing, setStanding] = useState<Standing | null>(null);
  const keeper = useKeeper(here, { id, item, version, state, setStatus, setStanding });
  const [copy, setCopy] = useCopy(here, { id, item, version, state });
  return (
    <div ref={here} className="amend-keep">
      <p role="status" className="font-sans text-plain text-umber">
        {status === null ? '' : status.kind === 'kept' ? said.kept.replace('{time}', status.at) : said[status.kind]}
      </p>
      {copy === null ? null : (
        <div className="panel panel-ash">
          <p>{said.copy}</p>
          <p className="mt-2 flex flex-wrap gap-3">
            <Plain
              onPress={() => {
                void keeper.keep(copy.values).then((isKept) => {
                  if (isKept) window.location.reload();
                });
              }}
            >
              {said.restore}
            </Plain>
            <Plain
              onPress={() => {
                dropCopy(id, item);
                setCopy(null);
              }}
            >
              {said.discard}
            </Plain>
          </p>
        </div>
      )}
      {standing === null ? null : <Theirs here={here} standing={standing} said={said} onMine={keeper.overwrite} />}
    </div>
  );
}

function Plain({ onPress, children }: { readonly onPress: () => void; readonly children: string }): ReactElement {
  return (
    <button type="button" className="button button-plain" onClick={onPress}>
      {children}
    </button>
  );
}

type TheirsProps = {
  readonly here: RefObject<HTMLDivElement | null>;
  readonly standing: Standing;
  readonly said: KeepWords;
  readonly onMine: (standing: Standing) => void;
};

/** What another tab kept meanwhile, field by field beside what stands in this form. Nothing is overwritten before somebody chose. */
function Theirs({ here, standing, said, onMine }: TheirsProps): ReactElement {
  const form = here.current?.closest('form');
  const mine = form === null || form === undefined ? {} : valuesOf(form);
  const names = Object.keys(standing.values ?? {}).filter((name) => !sameValues(pick(mine, name), pick(standing.values ?? {}, name)));
  return (
    <div className="panel panel-copper" role="alert">
      <p>{standing.values === null ? said.gone : said.moved}</p>
      <dl className="mt-2">
        {names.map((name) => (
          <div key={name} className="mt-2">
            <dt className="font-strong">{labelOf(form, name)}</dt>
            <dd>
              {said.theirs} {[standing.values?.[name] ?? ''].flat().join(', ')}
            </dd>
          </div>
        ))}
      </dl>
      <p className="mt-3 flex flex-wrap gap-3">
        <Plain
          onPress={() => {
            onMine(standing);
          }}
        >
          {said.keepMine}
        </Plain>
        <Plain
          onPress={() => {
            window.location.reload();
          }}
        >
          {said.takeTheirs}
        </Plain>
      </p>
    </div>
  );
}

const pick = (values: Values, name: string): Values => ({ [name]: values[name] ?? '' });
const labelOf = (form: HTMLFormElement | null | undefined, name: string): string =>
  form?.querySelector(`label[for="${CSS.escape(name)}"]`)?.textContent ?? name;

type Keeping = Omit<Props, 'said'> & {
  readonly setStatus: (status: Status) => void;
  readonly setStanding: (standing: Standing | null) => void;
};
type Keeper = { readonly keep: (values: Values) => Promise<boolean>; readonly overwrite: (standing: Standing) => void };

/** Watches the form, waits for a pause, and sends one entry after the other. */
function useKeeper(here: RefObject<HTMLDivElement | null>, { id, item, version, state, setStatus, setStanding }: Keeping): Keeper {
  const at = useRef(version);
  const timer = useRef<number | null>(null);
  const isSending = useRef(false);
  const again = useRef<() => void>(() => undefined);

  const keep = async (values: Values): Promise<boolean> => {
    isSending.current = true;
    setStatus({ kind: 'keeping' });
    const answer = await sendEntry({ id, item, version: at.current, values });
    isSending.current = false;
    switch (answer.kind) {
      case 'kept':
        at.current = answer.version;
        setVersion(here.current, answer.version);
        // What was typed since is on this device alone until its turn comes.
        if (timer.current === null) dropCopy(id, item);
        setStatus({ kind: 'kept', at: TIME.format(new Date()) });
        return true;
      case 'moved':
        setStatus(null);
        setStanding(answer.standing);
        return false;
      case 'signed-out':
        setStatus({ kind: 'signedOut' });
        return false;
      case 'failed':
        setStatus({ kind: 'failed' });
        again.current();
        return false;
    }
  };

  const latest = useRef(keep);
  useEffect(() => {
    latest.current = keep;
  });

  useEffect(() => {
    const form = here.current?.closest('form');
    if (form === null || form === undefined) return;
    const stop = (): void => {
      if (timer.current !== null) window.clearTimeout(timer.current);
      timer.current = null;
    };
    const flush = (): void => {
      if (timer.current === null) return;
      stop();
      if (isSending.current) wait(WAIT_MS);
      else void latest.current(valuesOf(form));
    };
    const wait = (ms: number): void => {
      stop();
      timer.current = window.setTimeout(flush, ms);
    };
    again.current = () => {
      wait(RETRY_MS);
    };
    const onInput = (): void => {
      putCopy(id, item, { values: valuesOf(form), version: at.current, state, isSent: false });
      wait(WAIT_MS);
    };
    // The form itself takes along what was typed since.
    const onSubmit = (): void => {
      stop();
      void markSent(id, item);
    };
    const onHide = (): void => {
      if (document.visibilityState === 'hidden') flush();
    };
    form.addEventListener('input', onInput);
    form.addEventListener('submit', onSubmit);
    document.addEventListener('visibilitychange', onHide);
    window.addEventListener('pagehide', flush);
    return () => {
      stop();
      form.removeEventListener('input', onInput);
      form.removeEventListener('submit', onSubmit);
      document.removeEventListener('visibilitychange', onHide);
      window.removeEventListener('pagehide', flush);
    };
  }, [here, id, item, state]);

  const overwrite = (standing: Standing): void => {
    at.current = standing.version;
    setStanding(null);
    const form = here.current?.closest('form');
    if (form !== null && form !== undefined) void keep(valuesOf(form));
  };
  return { keep, overwrite };
}

/** What the form sends along when it is sent itself. */
function setVersion(here: HTMLElement | null, version: number): void {
  const field = here?.closest('form')?.elements.namedItem('version');
  if (field instanceof HTMLInputElement) field.value = String(version);
}
