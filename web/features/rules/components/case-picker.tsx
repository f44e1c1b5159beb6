import { useState } from 'react';
import { Button } from 'react-aria-components/Button';
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
  const [picked, setPicked] = useState<string | null>(null);
  const ready = cases.filter(({ latestStudy }) => latestStudy?.status === 'finished');
  return (
    <ComboBox
      className="grid max-w-xl gap-1"
      items={ready.map((one) => ({ ...one, id: one.reference }))}
      inputValue={text}
      onInputChange={(next) => {
        setText(next);
        // The name of a case that is picked is no search for another.
        if (!ready.some((one) => nameOf(one) === next)) onSearch(next.trim());
      }}
      value={picked}
      onChange={(key) => {
        const found = ready.find(({ reference }) => reference === key);
        setPicked(found?.reference ?? null);
        if (found === undefined) return;
        setText(nameOf(found));
        onPick(found);
      }}
      allowsEmptyCollection
      menuTrigger="input"
    >
      <FieldLabel>Case</FieldLabel>
      <FieldDescription>By number, title or address; those with a finished study.</FieldDescription>
      <div className="flex">
        <Input className={inputClass} autoComplete="off" />
        <Button
          className="-ms-px min-w-10 cursor-pointer border border-ink"
          aria-label="Show the cases"
        >
          <span aria-hidden="true">▾</span>
        </Button>
      </div>
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
              textValue={nameOf(one)}
              className="group cursor-pointer px-3 py-1.5 data-focused:bg-ink data-focused:text-paper"
            >
              {nameOf(one)}{' '}
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

function nameOf({ reference, title }: CaseSummary): string {
  return `${reference} ${title}`;
}
