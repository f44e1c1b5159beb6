import { useState } from 'react';
import { sayClause } from '../../../../shared/rules/clause-sentence.ts';
import {
  ruleTemplates,
  type RuleTemplate,
} from '../../../../shared/rules/templates/rule-templates.ts';
import { Button } from '../../../components/button.tsx';
import { Dialog } from '../../../components/dialog.tsx';
import { TextField } from '../../../components/text-field.tsx';
import { useFormats } from '../../../lib/place-context.ts';
import { clauseFigures } from '../clause-in-words.ts';

export interface TemplateDialogProps {
  isOpen: boolean;
  onClose: () => void;
  onPick: (template: RuleTemplate) => void;
}

/** Published approaches to begin from, found by what they ask for or by their source. */
export function TemplateDialog({ isOpen, onClose, onPick }: TemplateDialogProps) {
  const formats = useFormats();
  const [words, setWords] = useState('');
  const wanted = words.trim().toLowerCase();
  const found = ruleTemplates.filter(({ title, citation }) =>
    `${title} ${citation}`.toLowerCase().includes(wanted),
  );
  return (
    <Dialog
      title="Add from a template"
      isOpen={isOpen}
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
    >
      <p className="text-small">
        Published approaches to begin from. Hold each against your own text before it is put in
        force.
      </p>
      <TextField
        label="Find by what it asks for or by its source"
        value={words}
        onChange={setWords}
        autoFocus
      />
      <p className="sr-only" role="status">
        {found.length === 1 ? '1 template fits.' : `${found.length} templates fit.`}
      </p>
      <ul className="max-h-[55vh] overflow-y-auto border-b border-hairline" tabIndex={-1}>
        {found.map((template) => (
          <li key={template.id} className="grid gap-1 border-t border-hairline py-3">
            <h3>{template.title}</h3>
            <p className="text-small text-ink-soft">{template.citation}</p>
            {template.rule.clauses.map((clause) => (
              <p key={clause.id} className="text-small">
                {sayClause(clause, clauseFigures(formats))}
              </p>
            ))}
            {template.remark === '' ? null : <p className="text-small">{template.remark}</p>}
            <Button
              className="mt-1 justify-self-start"
              aria-label={`Add: ${template.title}`}
              onPress={() => onPick(template)}
            >
              {template.rule.clauses.length === 1
                ? 'Add this clause'
                : `Add these ${template.rule.clauses.length} clauses`}
            </Button>
          </li>
        ))}
        {found.length === 0 ? <li className="py-3">No template fits these words.</li> : null}
      </ul>
      <Button className="justify-self-end" onPress={onClose}>
        Close
      </Button>
    </Dialog>
  );
}
