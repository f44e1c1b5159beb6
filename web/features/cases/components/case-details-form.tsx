import { zodResolver } from '@hookform/resolvers/zod';
import type { ReactNode } from 'react';
import { useController, useForm, type Control } from 'react-hook-form';
import type { z } from 'zod';
import { createCaseInputSchema, type CreateCaseInput } from '../../../../shared/contracts/cases.ts';
import { Button } from '../../../components/button.tsx';
import { FormTextField } from '../../../components/form-text-field.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';

export interface CaseDetailsFormProps {
  initial: { title: string; description: string; siteParcels: string[] };
  submitLabel: string;
  isPending: boolean;
  error: Error | null;
  onSubmit: (input: CreateCaseInput) => void;
  onCancel?: () => void;
  /** Picks the site's parcels: by search and on the map. */
  renderParcels: (picked: readonly string[], onChange: (numbers: string[]) => void) => ReactNode;
}

type CaseDetailsValues = z.input<typeof createCaseInputSchema>;

/** Name, description and site of an application. */
export function CaseDetailsForm({
  initial,
  submitLabel,
  isPending,
  error,
  onSubmit,
  onCancel,
  renderParcels,
}: CaseDetailsFormProps) {
  const { control, handleSubmit } = useForm({
    resolver: zodResolver(createCaseInputSchema),
    defaultValues: initial,
  });
  const send = handleSubmit((input) => onSubmit(input));
  return (
    <form noValidate className="grid gap-6" onSubmit={(event) => void send(event)}>
      <div className="measure grid gap-4">
        <FormTextField
          control={control}
          name="title"
          label="Name of the project"
          description="As it shall stand on the notice, for example “Tallow Wharf Lofts”."
        />
        <FormTextField
          control={control}
          name="description"
          label="What is proposed"
          description="In a few sentences that a neighbour understands: use, number of dwellings, what stands there now."
          rows={5}
          optional
        />
      </div>
      <SiteParcelsField control={control} renderParcels={renderParcels} />
      {error === null ? null : <ProblemNotice error={error} />}
      <div className="flex flex-wrap gap-3">
        <Button type="submit" kind="primary" isPending={isPending}>
          {submitLabel}
        </Button>
        {onCancel === undefined ? null : <Button onPress={onCancel}>Leave it as it is</Button>}
      </div>
    </form>
  );
}

interface SiteParcelsFieldProps extends Pick<CaseDetailsFormProps, 'renderParcels'> {
  control: Control<CaseDetailsValues, unknown, z.output<typeof createCaseInputSchema>>;
}

/** On its own, so that the form looks for its first error in the order of the page. */
function SiteParcelsField({ control, renderParcels }: SiteParcelsFieldProps) {
  const {
    field: { ref: parcelsRef, value: picked, onChange: setPicked },
    fieldState: { error: parcelsError },
  } = useController({ control, name: 'siteParcels' });
  return (
    <fieldset className="grid gap-3" ref={parcelsRef} tabIndex={-1}>
      <legend className="pb-1 font-strong">Parcels of the site</legend>
      {parcelsError === undefined ? null : (
        <p role="alert" className="text-small font-strong text-madder">
          ✕ {parcelsError.message}
        </p>
      )}
      {renderParcels(picked, setPicked)}
    </fieldset>
  );
}
