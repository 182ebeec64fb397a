import type { ReactElement, ReactNode } from 'react';
import { PlaceChoices, type PlaceChoice } from '@/components/site/place-choices';
import { Disclosure } from '@/components/ui/disclosure';
import { ErrorSummary } from '@/components/ui/error-summary';
import { controlProps, Field } from '@/components/ui/field';
import { SubmitButton } from '@/components/ui/submit-button';
import { words } from '@/lib/kernel/words';
import { rowCount } from '@/lib/readings/domain/typed-rows';
import { errorAt, type FormView } from './form-view';
import { PastedPreview } from './pasted-preview';
import { PieceFields } from './piece-fields';
import { ProfileFields } from './profile-fields';
import { RowTable } from './row-table';
import { sheetFaultWords } from './sheet-fault-words';
import { ConditionFields, ExtractFields } from './test-fields';

type Props = {
  /** The address the entry will be kept under. */
  readonly address: string;
  readonly view: FormView;
  readonly places: readonly PlaceChoice[];
  readonly submit: string;
  readonly act: (form: FormData) => Promise<void>;
};

/** The whole entry: places, piece, profile, figures, further pieces, extracts and how the lab tested. */
export function ReadingsForm({ address, view, places, submit, act }: Props): ReactElement {
  const { entry } = view;
  return (
    <form action={act} noValidate className="flex flex-col gap-8">
      <Faults view={view} />
      <input type="hidden" name="key" value={address} />
      <EnterKey />
      <Part id="places">
        <PlaceFields view={view} places={places} />
      </Part>
      <Part id="piece">
        <p>{words('readings-page.piece.lead')}</p>
        <PieceFields view={view} />
      </Part>
      <Part id="profile">
        <p className="max-w-text">{words('readings-page.profile.lead')}</p>
        <ProfileFields view={view} />
      </Part>
      <Part id="rows">
        <p className="max-w-text">{words('readings-page.rows.lead')}</p>
        <RowTable list="readings" view={view} />
        <PastedPreview list="readings" lines={entry.pasted.readings} />
        <Disclosure summary={words('readings-page.rows.furtherHeading')} open={isFurtherUsed(view)}>
          <p className="mb-4 max-w-text">{words('readings-page.rows.furtherLead')}</p>
          <RowTable list="further" view={view} />
          <PastedPreview list="further" lines={entry.pasted.further} />
        </Disclosure>
      </Part>
      <Part id="extracts">
        <p className="max-w-text">{words('readings-page.extracts.lead')}</p>
        <ExtractFields view={view} />
      </Part>
      <Part id="conditions">
        <p>{words('readings-page.conditions.lead')}</p>
        <ConditionFields view={view} />
      </Part>
      <div>
        <SubmitButton busy={words('readings-page.act.busy')}>{submit}</SubmitButton>
      </div>
    </form>
  );
}

/**
 * The Enter key presses a form's first button. Without this one that would be "Draw the profile"; it is out of sight, out of the
 * order of the keyboard, and the same as the last button of the page.
 */
function EnterKey(): ReactElement {
  return <button type="submit" className="sr-only" tabIndex={-1} aria-hidden="true" />;
}

function Faults({ view: { faults } }: Pick<Props, 'view'>): ReactElement | null {
  if (faults.length === 0) return null;
  return (
    <ErrorSummary
      heading={words('readings-page.faults.heading', { count: faults.length })}
      faults={faults.map((fault) => ({ id: fault.field, said: sheetFaultWords(fault) }))}
      tries={faults.length}
    />
  );
}

type PartProps = { readonly id: 'places' | 'piece' | 'profile' | 'rows' | 'extracts' | 'conditions'; readonly children: ReactNode };

function Part({ id, children }: PartProps): ReactElement {
  return (
    <section aria-labelledby={`part-${id}`} className="flex flex-col gap-4">
      <h2 id={`part-${id}`}>{words(`readings-page.${id}.heading`)}</h2>
      {children}
    </section>
  );
}

function PlaceFields({ view, places }: Pick<Props, 'view' | 'places'>): ReactElement {
  const day = {
    label: words('readings-page.places.day'),
    hint: words('readings-page.places.dayHint'),
    error: errorAt(view, 'on'),
  };
  return (
    <>
      <PlaceChoices
        id="region"
        name="region"
        legend={words('readings-page.places.legend')}
        hint={words('readings-page.places.hint')}
        error={errorAt(view, 'region')}
        places={places}
        chosen={view.entry.regions}
      />
      <Field id="on" {...day}>
        <input type="date" className="control" name="on" defaultValue={view.fields['on']?.[0]} {...controlProps('on', day)} />
      </Field>
    </>
  );
}

function isFurtherUsed({ fields, entry, faults }: FormView): boolean {
  const isNamed = faults.some(({ place }) => place === 'further');
  const isFilled = entry.rows.further.length > 0 || entry.pasted.further.length > 0;
  return isNamed || isFilled || rowCount(fields, 'further') > rowCount({}, 'further');
}
