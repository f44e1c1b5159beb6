import { DesignSection, Specimen } from './design-section.tsx';

const colours = [
  { name: 'paper', className: 'bg-paper', use: 'the page' },
  { name: 'sheet', className: 'bg-sheet', use: 'inputs, maps' },
  { name: 'ink', className: 'bg-ink', use: 'text, outlines, met' },
  { name: 'ink-soft', className: 'bg-ink-soft', use: 'text that stands back' },
  { name: 'hairline', className: 'bg-hairline', use: 'rules between rows' },
  { name: 'marigold', className: 'bg-marigold', use: 'sun: lines and text' },
  { name: 'marigold-fill', className: 'bg-marigold-fill', use: 'sun: areas' },
  { name: 'marigold-wash', className: 'bg-marigold-wash', use: 'the chosen row' },
  { name: 'slate', className: 'bg-slate/35', use: 'shadow that is there already, 35 %' },
  { name: 'madder', className: 'bg-madder', use: 'net new, lost, not met' },
  { name: 'madder-wash', className: 'bg-madder-wash', use: 'ground of the hatch' },
  { name: 'hatched', className: 'hatched', use: 'net new shadow, sun lost' },
];

const spaces = ['w-1', 'w-2', 'w-3', 'w-4', 'w-6', 'w-8', 'w-10', 'w-16'];

export function TokensSection() {
  return (
    <DesignSection title="Colour and measure">
      <div className="grid grid-cols-2 gap-x-6 gap-y-5 sm:grid-cols-3 lg:grid-cols-6">
        {colours.map(({ name, className, use }) => (
          <Specimen key={name} name={name}>
            <div className={`h-14 border border-ink ${className}`} />
            <p className="mt-1 text-small">{use}</p>
          </Specimen>
        ))}
      </div>
      <Specimen name="steps of space: 4 px each">
        <div className="flex flex-wrap items-end gap-3">
          {spaces.map((width) => (
            <div key={width} className={`h-4 bg-ink ${width}`} />
          ))}
        </div>
      </Specimen>
    </DesignSection>
  );
}
