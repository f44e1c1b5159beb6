import { useState } from 'react';
import { ComboBox } from 'react-aria-components/ComboBox';
import { Input } from 'react-aria-components/Input';
import { ListBox, ListBoxItem } from 'react-aria-components/ListBox';
import { Popover } from 'react-aria-components/Popover';
import type { CaseSummary } from '../../../../shared/contracts/cases.ts';
import { FieldDescription, FieldLabel, inputClass } from '../../../components/field-parts.tsx';

export interface CasePickerProps {
  /** What fits the words, from the server. */
  cases: readonly CaseSummary[];
  isLoading: boolean;
  onSearch: (words: string) => void;
  onPick: (reviewCase: CaseSummary) => void;
}

/** Finds a case with a finished study by its number, its title or its address. */
export function CasePicker({ cases, isLoading, onSearch, onPick }: CasePickerProps) {
  const [text, setText] = useState('');
  const ready = cases.filter(({ latestStudy }) => latestStudy?.status === 'finished');
  return (
    <ComboBox
      className="grid max-w-xl gap-1"
      items={ready.map((one) => ({ ...one, id: one.reference }))}
      inputValue={text}
      onInputChange={(next) => {
        setText(next);
        onSearch(next.trim());
      }}
      onChange={(key) => {
        const picked = ready.find(({ reference }) => reference === key);
        if (picked === undefined) return;
        setText('');
        onSearch('');
        onPick(picked);
      }}
      value={null}
      allowsEmptyCollection
      menuTrigger="focus"
    >
      <FieldLabel>Case</FieldLabel>
      <FieldDescription>By number, title or address; those with a finished study.</FieldDescription>
      <Input className={inputClass} autoComplete="off" />
      <Popover className="w-(--trigger-width) border border-ink bg-sheet">
        <ListBox<CaseSummary & { id: string }>
          className="max-h-80 overflow-auto py-1"
          renderEmptyState={() => (
            <p className="px-3 py-2 text-small text-ink-soft">
              {isLoading ? 'Searching …' : 'No case with a finished study fits.'}
            </p>
          )}
        >
          {(one) => (
            <ListBoxItem
              id={one.id}
              textValue={`${one.reference} ${one.title}`}
              className="group cursor-pointer px-3 py-1.5 data-focused:bg-ink data-focused:text-paper"
            >
              {one.reference} {one.title}{' '}
              <span className="text-small text-ink-soft group-data-focused:text-paper">
                {one.address}
              </span>
            </ListBoxItem>
          )}
        </ListBox>
      </Popover>
    </ComboBox>
  );
}
