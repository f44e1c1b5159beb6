import { Caution } from '../../components/caution.tsx';
import { paths } from '../paths.ts';
import { DesignSection, Specimen } from './design-section.tsx';

const sizes = [
  { name: 'title, 26 px strong', className: 'text-title font-strong' },
  { name: 'heading, 20 px strong', className: 'text-heading font-strong' },
  { name: 'lead, 18 px', className: 'text-lead' },
  { name: 'body, 16 px', className: 'text-body' },
  { name: 'small, 14 px', className: 'text-small' },
  { name: 'label, small capitals', className: 'label-caps' },
];

export function TypeSection() {
  return (
    <DesignSection title="Type">
      <div className="grid gap-5">
        {sizes.map(({ name, className }) => (
          <Specimen key={name} name={name}>
            <p className={className}>On 21 December this yard has 3 h 05 min of sun</p>
          </Specimen>
        ))}
      </div>
      <div className="grid gap-6 md:grid-cols-2">
        <Specimen name="figures stand under each other">
          <p className="text-end text-lead">
            1,240.5 m²
            <br />
            11,111.1 m²
          </p>
        </Specimen>
        <Specimen name="a sentence that matters">
          <p className="say">
            12 Netloft Lane has <strong>5 h 01 min</strong> of sun now, and{' '}
            <strong>2 h 50 min</strong> with the proposal.
          </p>
        </Specimen>
        <Specimen name="a link in running text">
          <p>
            Read{' '}
            <a href="#main" className="link">
              how it is computed
            </a>
            .
          </p>
        </Specimen>
        <Specimen name="the limits that go with every figure">
          <Caution methodHref={paths.method.href()} />
        </Specimen>
      </div>
    </DesignSection>
  );
}
