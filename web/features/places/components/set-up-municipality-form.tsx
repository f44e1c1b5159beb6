import { useState } from 'react';
import { setUpMunicipalityInputSchema } from '../../../../shared/contracts/base-data.ts';
import { Button } from '../../../components/button.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { TextField } from '../../../components/text-field.tsx';
import { useSetUpMunicipality } from '../api/set-up-municipality.ts';
import { readPlace, type PlaceTexts } from '../place-texts.ts';

const fields: readonly { name: keyof PlaceTexts; label: string; description?: string }[] = [
  { name: 'name', label: 'Name', description: 'As it stands on reports: City of Larkhaven.' },
  { name: 'shortName', label: 'Short name', description: 'Larkhaven' },
  { name: 'timeZone', label: 'Time zone', description: 'Its IANA name: America/Chicago.' },
  { name: 'locale', label: 'Form of dates and numbers', description: 'A language tag: en-US.' },
  { name: 'latitude', label: 'Latitude', description: 'Degrees, south of the equator negative.' },
  { name: 'longitude', label: 'Longitude', description: 'Degrees, west of Greenwich negative.' },
  { name: 'elevationM', label: 'Metres above sea level' },
  { name: 'west', label: 'Westernmost longitude' },
  { name: 'south', label: 'Southernmost latitude' },
  { name: 'east', label: 'Easternmost longitude' },
  { name: 'north', label: 'Northernmost latitude' },
  { name: 'studyYear', label: 'Year of the key dates' },
];

/** The first administrator says which place the server serves; all studies stand on it. */
export function SetUpMunicipalityForm() {
  const setUp = useSetUpMunicipality();
  const [texts, setTexts] = useState<PlaceTexts>({});
  const [problems, setProblems] = useState<Partial<Record<keyof PlaceTexts, string>>>({});
  return (
    <form
      noValidate
      className="grid max-w-3xl gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        const read = readPlace(texts, setUpMunicipalityInputSchema);
        setProblems(read.problems);
        if (read.input !== null) setUp.mutate(read.input);
      }}
    >
      <p className="measure">
        The sun, the local plane and the clock of every study come from these. They cannot be
        changed afterwards.
      </p>
      <div className="grid gap-4 sm:grid-cols-2">
        {fields.map(({ name, label, description }) => (
          <TextField
            key={name}
            label={label}
            description={description}
            value={texts[name] ?? ''}
            onChange={(text) => setTexts({ ...texts, [name]: text })}
            problem={problems[name]}
          />
        ))}
      </div>
      {setUp.isError ? <ProblemNotice error={setUp.error} /> : null}
      <Button
        type="submit"
        kind="primary"
        isPending={setUp.isPending}
        className="justify-self-start"
      >
        Set up this place
      </Button>
    </form>
  );
}
