import type { ReactElement } from 'react';
import { AmountField } from '@/components/ui/amount-field';
import { DataTable } from '@/components/ui/data-table';
import { SelectField } from '@/components/ui/select-field';
import { words } from '@/lib/kernel/words';
import { areaField, EXTRACT_PARTS, volumeField } from '@/lib/readings/domain/sheet-entry';
import { firstOf } from '@/lib/readings/domain/typed-rows';
import { CellInput } from './cell-input';
import { errorAt, type FormView } from './form-view';

type Props = { readonly view: FormView };

/** What the lab filled in and the surface it touched, part by part. */
export function ExtractFields({ view }: Props): ReactElement {
  return (
    <DataTable
      id="extracts"
      caption={words('readings-page.extracts.caption')}
      columns={[
        { id: 'part', heading: words('readings-page.extracts.part') },
        { id: 'volume', heading: words('readings-page.extracts.volume') },
        { id: 'area', heading: words('readings-page.extracts.area') },
      ]}
      rows={EXTRACT_PARTS.map((part) => {
        const said = words(`readings-page.rows.part.${part}`);
        return {
          id: part,
          cells: {
            part: said,
            volume: <Size field={volumeField(part)} label={words('readings-page.extracts.volumeOf', { part: said })} view={view} />,
            area: <Size field={areaField(part)} label={words('readings-page.extracts.areaOf', { part: said })} view={view} />,
          },
        };
      })}
    />
  );
}

function Size({ field, label, view }: Props & { readonly field: string; readonly label: string }): ReactElement {
  return <CellInput field={field} label={label} value={firstOf(view.fields, field)} error={errorAt(view, field)} decimal />;
}

/** How the lab tested, where that was otherwise than the method asks. */
export function ConditionFields({ view }: Props): ReactElement {
  const yesNo = [
    { value: 'yes', label: words('readings-page.piece.yes') },
    { value: 'no', label: words('readings-page.piece.no') },
  ];
  return (
    <div className="two-fields">
      <AmountField
        id="temperature"
        name="temperature"
        label={words('readings-page.conditions.temperature')}
        error={errorAt(view, 'temperature')}
        unit="°C"
        unitSpoken={words('readings-page.conditions.temperatureUnit')}
        defaultValue={firstOf(view.fields, 'temperature')}
      />
      <AmountField
        id="hours"
        name="hours"
        label={words('readings-page.conditions.hours')}
        error={errorAt(view, 'hours')}
        unit={words('readings-page.conditions.hoursUnit')}
        unitSpoken={words('readings-page.conditions.hoursUnit')}
        defaultValue={firstOf(view.fields, 'hours')}
      />
      {(['dark', 'hot'] as const).map((id) => (
        <SelectField
          key={id}
          id={id}
          name={id}
          label={words(`readings-page.conditions.${id}`)}
          none={words('readings-page.conditions.asMethod')}
          options={yesNo}
          chosen={firstOf(view.fields, id)}
        />
      ))}
    </div>
  );
}
