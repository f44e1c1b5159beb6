import { useState } from 'react';
import { ButtonLink } from '../../components/button-link.tsx';
import { Button, type ButtonProps } from '../../components/button.tsx';
import { ChoiceRow } from '../../components/choice-row.tsx';
import { NavLinks } from '../../components/nav-links.tsx';
import { Pager } from '../../components/pager.tsx';
import { DesignSection, Specimen } from './design-section.tsx';

const kinds: { kind: NonNullable<ButtonProps['kind']>; label: string }[] = [
  { kind: 'primary', label: 'Submit the application' },
  { kind: 'secondary', label: 'Save for later' },
  { kind: 'danger', label: 'Withdraw the application' },
  { kind: 'plain', label: 'Show 20 more' },
];

const layers = [
  { id: 'before', label: 'Before' },
  { id: 'after', label: 'After' },
  { id: 'net-new', label: 'Net new difference' },
] as const;

export function ActionsSection() {
  const [layer, setLayer] = useState<(typeof layers)[number]['id'] | null>('after');
  const [page, setPage] = useState(2);
  return (
    <DesignSection title="Buttons, links and choices">
      <div className="grid gap-5">
        {kinds.map(({ kind, label }) => (
          <div key={kind} className="flex flex-wrap items-end gap-6">
            <Specimen name={kind}>
              <Button kind={kind}>{label}</Button>
            </Specimen>
            <Specimen name={`${kind}, at work`}>
              <Button kind={kind} isPending>
                {label}
              </Button>
            </Specimen>
            <Specimen name={`${kind}, not possible`}>
              <Button kind={kind} isDisabled>
                {label}
              </Button>
            </Specimen>
          </div>
        ))}
      </div>
      <div className="flex flex-wrap items-end gap-6">
        <Specimen name="link, primary">
          <ButtonLink kind="primary" to="#main">
            Start an application
          </ButtonLink>
        </Specimen>
        <Specimen name="link, secondary">
          <ButtonLink to="#main">Open the case</ButtonLink>
        </Specimen>
      </div>
      <div className="grid gap-6 md:grid-cols-2">
        <Specimen name="one of a few">
          <ChoiceRow label="What is shown" options={layers} value={layer} onChange={setLayer} />
        </Specimen>
        <Specimen name="one of a few, none chosen">
          <ChoiceRow
            label="What is shown at first"
            options={layers}
            value={null}
            onChange={setLayer}
          />
        </Specimen>
        <Specimen name="parts of one thing">
          <NavLinks
            label="Parts of a case"
            links={[
              { to: '/design', label: 'Study' },
              { to: '/method', label: 'Findings' },
            ]}
          />
        </Specimen>
        <Specimen name="pages of a list">
          <Pager page={page} pageSize={20} total={55} onPage={setPage} />
        </Specimen>
      </div>
    </DesignSection>
  );
}
