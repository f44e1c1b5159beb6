import { useState } from 'react';
import { FileDrop } from '../../components/file-drop.tsx';
import { SearchForm } from '../../components/search-form.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { TextField } from '../../components/text-field.tsx';
import { DesignSection, Specimen } from './design-section.tsx';

const topics = [
  { id: 'sun', label: 'Sun and shadow' },
  { id: 'noise', label: 'Noise' },
  { id: 'wrong', label: 'My building, window or yard is wrong' },
] as const;

export function FieldsSection() {
  const [topic, setTopic] = useState<(typeof topics)[number]['id']>('sun');
  const [fileName, setFileName] = useState<string | null>(null);
  return (
    <DesignSection title="Fields">
      <div className="grid gap-6 md:grid-cols-2 lg:grid-cols-3">
        <Specimen name="empty, with a hint">
          <TextField
            label="Name of the project"
            description="As it shall stand on the report."
            placeholder="Netloft Court"
          />
        </Specimen>
        <Specimen name="filled, may be left out">
          <TextField label="Firm" optional defaultValue="Brinewell Drawing Office" />
        </Specimen>
        <Specimen name="with an error">
          <TextField
            label="E-mail address"
            defaultValue="wenna"
            problem="Write an address with an @, for example you@example.org."
          />
        </Specimen>
        <Specimen name="not open">
          <TextField label="Case number" isDisabled defaultValue="2026-0001" />
        </Specimen>
        <Specimen name="to be read only">
          <TextField label="Zone" isReadOnly defaultValue="America/Chicago" />
        </Specimen>
        <Specimen name="several lines">
          <TextField label="What do you want to say?" rows={3} />
        </Specimen>
        <Specimen name="one of a list">
          <SelectField
            label="What it is about"
            description="It helps us to send it to the right desk."
            options={topics}
            value={topic}
            onChange={setTopic}
          />
        </Specimen>
        <Specimen name="one of a list, with an error">
          <SelectField
            label="Topic"
            options={topics}
            value={topic}
            onChange={setTopic}
            problem="Choose what it is about."
          />
        </Specimen>
        <Specimen name="search">
          <SearchForm
            label="Address, parcel or case number"
            value=""
            placeholder="12 Netloft Lane"
            onSearch={() => undefined}
          />
        </Specimen>
        <Specimen name="a file">
          <FileDrop label="the massing" onFile={(file) => setFileName(file.name)}>
            <p className="text-small text-ink-soft">{fileName ?? 'GeoJSON, up to 20 MB'}</p>
          </FileDrop>
        </Specimen>
      </div>
    </DesignSection>
  );
}
