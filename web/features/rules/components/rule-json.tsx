import { useState } from 'react';
import type { Rule } from '../../../../shared/rules/rule-schema.ts';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/text-field.tsx';
import type { RuleReading } from '../rule-problems.ts';

export interface RuleJsonProps {
  /** The rule as it stands in the form. */
  value: Record<string, unknown>;
  /** Reads a rule that was pasted; its id and number are those of the form. */
  read: (value: object) => RuleReading;
  onTake: (rule: Rule) => void;
}

/** The same rule as data, for who wants it: to read, to copy, to paste another. */
export function RuleJson({ value, read, onTake }: RuleJsonProps) {
  /** Null while nobody has written here. */
  const [text, setText] = useState<string | null>(null);
  const [refusal, setRefusal] = useState<readonly string[]>([]);
  const current = JSON.stringify(value, null, 2);
  const take = () => {
    const parsed = parseObject(text ?? current);
    if (parsed === null) {
      setRefusal(['This is no JSON object. Look for a missing bracket, comma or quotation mark.']);
      return;
    }
    const { rule, problems } = read(parsed);
    if (rule === null) {
      setRefusal([...problems].map(([path, message]) => `${path}: ${message}`));
      return;
    }
    onTake(rule);
    setText(null);
    setRefusal([]);
  };
  return (
    <details>
      <summary className="min-h-6 cursor-pointer">The same as data (JSON)</summary>
      <div className="mt-3 grid gap-3">
        <TextField
          label="The rule as data"
          description="It follows the form. What you write or paste here takes its place once you press the button."
          rows={18}
          className="font-mono text-[0.8125rem]"
          value={text ?? current}
          onChange={setText}
          spellCheck="false"
        />
        {refusal.length === 0 ? null : (
          <ul role="alert" className="text-small font-strong text-madder">
            {refusal.map((one) => (
              <li key={one}>✕ {one}</li>
            ))}
          </ul>
        )}
        <div className="flex flex-wrap gap-4">
          <Button isDisabled={text === null} onPress={take}>
            Take this over into the form
          </Button>
          {text === null ? null : (
            <Button
              kind="plain"
              onPress={() => {
                setText(null);
                setRefusal([]);
              }}
            >
              Back to what the form says
            </Button>
          )}
        </div>
      </div>
    </details>
  );
}

function parseObject(text: string): object | null {
  try {
    const parsed: unknown = JSON.parse(text);
    return typeof parsed === 'object' && parsed !== null && !Array.isArray(parsed) ? parsed : null;
  } catch {
    return null;
  }
}
