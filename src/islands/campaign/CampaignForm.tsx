import { useEffect, useRef, useState, type SubmitEvent } from 'react';
import type { ReadingDimension } from '../../kinetics/types';
import { asApiError, requestJson, type ApiError } from '../api';
import { Button } from '../Button';
import { ErrorNote } from '../ErrorNote';
import {
  campaignRequest,
  concentrationUnits,
  emptyCampaign,
  faultsByField,
  type CampaignFaults,
  type CampaignField,
} from './campaignFields';
import { TextField } from './TextField';

const dimensions: [value: ReadingDimension, label: string][] = [
  ['concentration', 'Concentration'],
  ['pressure', 'Partial pressure'],
  ['ratio', 'Ratio to the start'],
];

/** Defines a campaign: one reaction, and the conditions at which its candidates are compared. */
export function CampaignForm({ groupId }: { groupId: string }) {
  const [fields, setFields] = useState(emptyCampaign);
  const [faults, setFaults] = useState<CampaignFaults>({});
  const [error, setError] = useState<ApiError | null>(null);
  const [saving, setSaving] = useState(false);
  const form = useRef<HTMLFormElement>(null);
  useEffect(() => {
    form.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus();
  }, [faults]);

  const bind = (name: CampaignField) => ({
    name,
    value: fields[name],
    fault: faults[name],
    onChange: (value: string) => setFields((before) => ({ ...before, [name]: value })),
  });
  const submit = async (event: SubmitEvent) => {
    event.preventDefault();
    setError(null);
    const checked = campaignRequest(fields, groupId);
    if ('faults' in checked) {
      setFaults(checked.faults);
      return;
    }
    setFaults({});
    setSaving(true);
    try {
      const { href } = await requestJson<{ href: string }>('/api/v1/campaigns', {
        method: 'POST',
        json: checked.request,
      });
      location.assign(href);
    } catch (thrown) {
      const refused = asApiError(thrown);
      setFaults(faultsByField(refused.errors));
      if (refused.errors.length === 0) setError(refused);
      setSaving(false);
    }
  };

  return (
    <form
      ref={form}
      noValidate
      onSubmit={(event) => void submit(event)}
      aria-labelledby="new-campaign"
      className="border-rule mt-12 max-w-2xl space-y-5 border-t pt-6"
    >
      <h2 id="new-campaign" className="text-[18px] font-semibold">
        New campaign
      </h2>
      <TextField label="Name" {...bind('name')} />
      <TextField
        label="Reactant followed"
        hint="The species whose decay is read in every well."
        {...bind('reactant')}
      />
      <fieldset className="m-0 border-0 p-0">
        <legend className="font-semibold">Readings are a</legend>
        <div className="mt-1 flex flex-wrap gap-x-6 gap-y-1">
          {dimensions.map(([value, label]) => (
            <label key={value} className="flex min-h-7 cursor-pointer items-center gap-2">
              <input
                type="radio"
                name="dimension"
                className="accent-accent size-4"
                checked={fields.dimension === value}
                onChange={() => setFields((before) => ({ ...before, dimension: value }))}
              />
              {label.toLowerCase()}
            </label>
          ))}
        </div>
      </fieldset>
      <div>
        <h3 className="mt-8">Conditions of the comparison</h3>
        <p className="text-quiet mb-3">
          Every candidate’s rate is brought to these. Choose them inside the range that the screens
          measure.
        </p>
        <div className="grid gap-x-8 gap-y-5 sm:grid-cols-2">
          <TextField label="Temperature" unit="°C" numeric {...bind('referenceTemperatureC')} />
          <TextField
            label={fields.dimension === 'pressure' ? 'Pressure' : 'Concentration'}
            unit={concentrationUnits[fields.dimension].unit}
            numeric
            {...bind('referenceConcentration')}
          />
          <TextField
            label="Catalyst loading"
            unit="g/L"
            numeric
            {...bind('referenceLoadingGPerL')}
          />
          <TextField label="Target conversion" unit="%" numeric {...bind('targetConversion')} />
        </div>
      </div>
      <TextField
        label="Standing conditions"
        rows={3}
        hint="Gas and pressure, co-reactant and its excess, solvent, pH, stirring."
        {...bind('conditions')}
      />
      {faults.form && (
        <p role="alert" className="text-refusal">
          {faults.form}
        </p>
      )}
      {error && <ErrorNote error={error} />}
      <Button kind="main" type="submit" disabled={saving}>
        {saving ? 'Saving…' : 'Create campaign'}
      </Button>
    </form>
  );
}
