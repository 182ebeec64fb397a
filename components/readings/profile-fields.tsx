import type { ReactElement } from 'react';
import { AmountField } from '@/components/ui/amount-field';
import { Button } from '@/components/ui/button';
import { Choice } from '@/components/ui/choice';
import { DataTable } from '@/components/ui/data-table';
import { DefinitionList } from '@/components/ui/definition-list';
import { words } from '@/lib/kernel/words';
import { insideDepthMm } from '@/lib/pieces/domain/region-measures';
import { heightField, PROFILE_POINTS, radiusField, SPILL_FIELD, USE_PROFILE, type ReadProfile } from '@/lib/readings/domain/profile-entry';
import { firstOf } from '@/lib/readings/domain/typed-rows';
import { CellInput } from './cell-input';
import { errorAt, type FormView } from './form-view';
import { ProfileDrawing } from './profile-drawing';

const COLUMNS = [
  { id: 'point', heading: words('readings-page.profile.point') },
  { id: 'radius', heading: words('readings-page.profile.radius') },
  { id: 'height', heading: words('readings-page.profile.height') },
] as const;

/** Points of the inside in a table, the drawing beside it, and the measures that come of it, shown before they are used. */
export function ProfileFields({ view }: { readonly view: FormView }): ReactElement {
  const points = Array.from({ length: PROFILE_POINTS }, (_, place) => place + 1);
  return (
    <div className="columns">
      <div className="main-part">
        <DataTable
          id="profile"
          caption={words('readings-page.profile.caption')}
          columns={COLUMNS}
          rows={points.map((point) => ({
            id: String(point),
            cells: {
              point,
              radius: <PointInput field={radiusField(point)} label={words('readings-page.profile.radiusOf', { point })} view={view} />,
              height: <PointInput field={heightField(point)} label={words('readings-page.profile.heightOf', { point })} view={view} />,
            },
          }))}
        />
        <div className="mt-4">
          <AmountField
            id={SPILL_FIELD}
            name={SPILL_FIELD}
            label={words('readings-page.profile.spill')}
            hint={words('readings-page.profile.spillHint')}
            error={errorAt(view, SPILL_FIELD)}
            unit="mm"
            unitSpoken={words('measures.unit.spoken.mm')}
            defaultValue={firstOf(view.fields, SPILL_FIELD)}
          />
        </div>
        <div className="mt-4">
          <Button kind="plain" name="act" value="draw">
            {words('readings-page.act.draw')}
          </Button>
        </div>
      </div>
      <div className="side-part mt-4 lg:mt-0" id="drawn">
        <Drawn profile={view.entry.profile} used={firstOf(view.fields, USE_PROFILE) !== ''} />
      </div>
    </div>
  );
}

type PointProps = { readonly field: string; readonly label: string; readonly view: FormView };

function PointInput({ field, label, view }: PointProps): ReactElement {
  return <CellInput field={field} label={label} value={firstOf(view.fields, field)} error={errorAt(view, field)} decimal />;
}

function Drawn({ profile: { vessel, measured }, used }: { readonly profile: ReadProfile; readonly used: boolean }): ReactElement {
  if (vessel === null || measured === null) return <p className="field-hint">{words('readings-page.profile.none')}</p>;
  const depth = measured['depth-mm'];
  return (
    <>
      <ProfileDrawing vessel={vessel} />
      <DefinitionList
        entries={[
          {
            id: 'depth',
            name: words('readings-page.profile.depth'),
            value: depth === undefined ? <OpenDepth vessel={vessel} /> : words('readings-page.profile.mm', { value: depth }),
          },
          {
            id: 'capacity',
            name: words('readings-page.profile.capacity'),
            value: words('readings-page.profile.mL', { value: measured['capacity-ml'] }),
          },
        ]}
      />
      <p className="field-hint mt-2">{words('measures.profile.straight')}</p>
      <Choice
        id={USE_PROFILE}
        type="checkbox"
        name={USE_PROFILE}
        option={{ value: 'on', label: words('readings-page.profile.use'), hint: words('readings-page.profile.useHint') }}
        chosen={used}
      />
    </>
  );
}

function OpenDepth({ vessel }: { readonly vessel: NonNullable<ReadProfile['vessel']> }): ReactElement {
  return (
    <>
      {(['rim-plane', 'overflow'] as const).map((rule) => (
        <span key={rule} className="block">
          {words(`measures.profile.depth.${rule}`)}: {words('readings-page.profile.mm', { value: insideDepthMm(vessel, rule) })}
        </span>
      ))}
      <span className="block">{words('readings-page.profile.depthOpen')}</span>
    </>
  );
}
