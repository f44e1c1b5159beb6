import { useState } from 'react';
import type { RuleVersion } from '../../../../shared/contracts/rules.ts';
import { paths } from '../../../app/paths.ts';
import { ButtonLink } from '../../../components/button-link.tsx';
import { Button } from '../../../components/button.tsx';
import { ConfirmDialog } from '../../../components/confirm-dialog.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { useDiscardRuleDraft, useEnactRule } from '../api/write-rule.ts';
import { EnactDialog } from './enact-dialog.tsx';

export interface RuleActionsProps {
  version: RuleVersion;
  onEnacted: (version: RuleVersion) => void;
  onDiscarded: () => void;
}

/** What may be done with a version now. */
export function RuleActions({ version, onEnacted, onDiscarded }: RuleActionsProps) {
  const { id, abilities, state } = version;
  const [asked, setAsked] = useState<'enact' | 'call-back' | 'discard' | null>(null);
  const enact = useEnactRule(version);
  const discard = useDiscardRuleDraft(version);
  const close = () => setAsked(null);
  const may = (ability: RuleVersion['abilities'][number]) => abilities.includes(ability);
  return (
    <div className="no-print grid gap-3">
      <div className="flex flex-wrap gap-3">
        {may('change') ? (
          <ButtonLink to={paths.ruleEdit.href(id)} kind="primary">
            Edit the draft
          </ButtonLink>
        ) : null}
        {may('try') ? (
          <ButtonLink to={paths.ruleTrial.href(id)}>Try it on a case</ButtonLink>
        ) : null}
        {may('enact') && state === 'draft' ? (
          <Button onPress={() => setAsked('enact')}>Put it in force</Button>
        ) : null}
        {may('enact') && state === 'scheduled' ? (
          <Button onPress={() => setAsked('call-back')}>Call it back</Button>
        ) : null}
        {may('copy') ? (
          <ButtonLink to={paths.newRule.href({ from: id })}>Make a new version from it</ButtonLink>
        ) : null}
        {may('change') ? (
          <Button kind="danger" onPress={() => setAsked('discard')}>
            Throw the draft away
          </Button>
        ) : null}
      </div>
      {enact.isError && asked === null ? <ProblemNotice error={enact.error} /> : null}
      {discard.isError ? <ProblemNotice error={discard.error} /> : null}
      {asked === 'enact' ? (
        <EnactDialog
          version={version}
          isPending={enact.isPending}
          error={enact.error}
          onCancel={() => {
            enact.reset();
            close();
          }}
          onConfirm={(inForceFrom) =>
            enact.mutate(inForceFrom, {
              onSuccess: (enacted) => {
                close();
                onEnacted(enacted);
              },
            })
          }
        />
      ) : null}
      <ConfirmDialog
        title={`Call version ${version.rule.version} back?`}
        confirmLabel="Call it back"
        isOpen={asked === 'call-back'}
        isPending={enact.isPending}
        onConfirm={() => enact.mutate(null, { onSettled: close })}
        onCancel={close}
      >
        <p>It becomes a draft again and does not come into force. You can set another day later.</p>
      </ConfirmDialog>
      <ConfirmDialog
        title={`Throw version ${version.rule.version} away?`}
        confirmLabel="Throw the draft away"
        isOpen={asked === 'discard'}
        isPending={discard.isPending}
        isDanger
        onConfirm={() => discard.mutate(undefined, { onSuccess: onDiscarded, onSettled: close })}
        onCancel={close}
      >
        <p>The draft is gone for good. No study was judged by it, and none changes.</p>
      </ConfirmDialog>
    </div>
  );
}
