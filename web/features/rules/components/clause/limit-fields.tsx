import type { RuleLimit, RuleMeasure } from '../../../../../shared/rules/rule-schema.ts';
import { Button } from '../../../../components/button.tsx';
import { SelectField } from '../../../../components/select-field.tsx';
import { combine, isGroup, membersOf, type LimitJoint } from '../../limit-draft.ts';
import type { ProblemAt } from '../../rule-problems.ts';
import { LimitLeafFields } from './limit-leaf-fields.tsx';

export interface LimitFieldsProps {
  limit: RuleLimit;
  /** The clause's own. */
  measure: RuleMeasure;
  onChange: (limit: RuleLimit) => void;
  /** By a path within the limit: `.anyOf.0.atLeast`. */
  problemAt: ProblemAt;
  /** How deep this limit stands within others. */
  depth?: number;
  /** Which one it is, for people who hear the labels. */
  name?: string;
}

const joints = [
  { id: 'one', label: 'One requirement' },
  { id: 'anyOf', label: 'Any one of several is enough' },
  { id: 'allOf', label: 'All of several must hold' },
] as const satisfies readonly { id: LimitJoint; label: string }[];

const deepest = 2;

/** What is asked: one requirement, or several of which any or all must hold. */
export function LimitFields({
  limit,
  measure,
  onChange,
  problemAt,
  depth = 0,
  name = '',
}: LimitFieldsProps) {
  const members = membersOf(limit);
  const joint: LimitJoint = 'anyOf' in limit ? 'anyOf' : 'allOf' in limit ? 'allOf' : 'one';
  return (
    <div className="grid gap-3">
      {depth > 0 && !isGroup(limit) ? null : (
        <SelectField
          label={name === '' ? 'How many requirements' : `Requirement ${name}: of how many`}
          options={joints}
          value={joint}
          onChange={(next) => onChange(combine(next, members))}
        />
      )}
      {isGroup(limit) ? (
        <div className="grid gap-4 border-s border-ink ps-4">
          {members.map((member, index) => {
            const memberName = name === '' ? String(index + 1) : `${name}.${index + 1}`;
            return (
              // Requirements have no names of their own; their fields hold no state but their text.
              <div key={index} className="grid gap-2">
                <LimitFields
                  limit={member}
                  measure={measure}
                  depth={depth + 1}
                  name={memberName}
                  onChange={(next) => onChange(combine(joint, members.with(index, next)))}
                  problemAt={(path) => problemAt(`.${joint}.${index}${path}`)}
                />
                <div className="flex flex-wrap gap-x-5">
                  {members.length < 2 ? null : (
                    <Button
                      kind="plain"
                      aria-label={`Remove requirement ${memberName}`}
                      onPress={() => onChange(combine(joint, members.toSpliced(index, 1)))}
                    >
                      Remove this requirement
                    </Button>
                  )}
                  {isGroup(member) || depth + 1 >= deepest ? null : (
                    <Button
                      kind="plain"
                      aria-label={`Make several of requirement ${memberName}`}
                      onPress={() =>
                        onChange(
                          combine(
                            joint,
                            members.with(index, combine(otherJoint(joint), [member, member])),
                          ),
                        )
                      }
                    >
                      Make several of it
                    </Button>
                  )}
                </div>
              </div>
            );
          })}
          <Button
            kind="plain"
            className="justify-self-start"
            onPress={() => onChange(combine(joint, [...members, { keeps: 0.8 }]))}
          >
            Add a requirement
          </Button>
        </div>
      ) : (
        <LimitLeafFields
          leaf={limit}
          measure={measure}
          name={name}
          onChange={onChange}
          problemAt={problemAt}
        />
      )}
    </div>
  );
}

/** Within "any of" a group asks for all, and the other way round: else it would say nothing new. */
function otherJoint(joint: LimitJoint): LimitJoint {
  return joint === 'anyOf' ? 'allOf' : 'anyOf';
}
