import type { EntityManager } from '@mikro-orm/postgresql';
import type { Request, Response } from 'express';
import {
  ruleTrialSchema,
  type TrialLine,
  type TryRuleInput,
} from '../../../shared/contracts/rule-trials.ts';
import { checkRule } from '../../../shared/rules/check-rule.ts';
import { AppError } from '../../errors.ts';
import type { Actor } from '../../policy.ts';
import { getFinishedStudy } from '../studies/get-study.ts';
import { readStoredInput } from '../studies/read-evidence.ts';
import type { Study } from '../studies/study.entity.ts';
import { refuse } from './check-rule-here.ts';
import { compareTrial } from './compare-trial.ts';
import { readRuleCalendar } from './find-rule-in-force.ts';
import { judgeRulesApart } from './judge-rules-apart.ts';

/** Each takes a processor for itself. */
const mostAtOnce = 2;
let underWay = 0;

/**
 * Judges the case of a finished study by a rule beside the one in force: both from the input that the
 * study keeps, both by this engine. Tells how far it is, then the result; nothing is stored. It ends
 * when the person goes away. Throws NOT_FOUND, STUDY_NOT_FINISHED, INPUT_INVALID or UNAVAILABLE.
 */
export async function streamRuleTrial(
  em: EntityManager,
  actor: Actor,
  { study: studyId, rule }: TryRuleInput,
  { request, response }: { request: Request; response: Response },
): Promise<void> {
  const study = await getFinishedStudy(em, actor, studyId, ['evidence']);
  const input = readStoredInput(study);
  const issues = checkRule(rule, input.place, input.year);
  if (issues.length > 0) {
    refuse(...issues.map(({ path, message }) => ({ path: `rule.${path}`, message })));
  }
  const { inForce } = await readRuleCalendar(em);
  if (inForce === null) throw new AppError('RULE_MISSING');
  if (underWay >= mostAtOnce) {
    throw new AppError('UNAVAILABLE', {
      title: 'Other rules are being tried at the moment. Wait until one is done and try again.',
    });
  }

  const gone = new AbortController();
  response.on('close', () => gone.abort());
  underWay += 1;
  try {
    response.status(200).set({
      'Content-Type': 'application/x-ndjson; charset=utf-8',
      'Cache-Control': 'no-store',
      'X-Accel-Buffering': 'no',
    });
    response.flushHeaders();
    const [draft, standing] = await judgeRulesApart(input, [rule, inForce.rule], {
      signal: gone.signal,
      onProgress: (progress) => writeLine(response, { progress }),
    });
    if (draft === undefined || standing === undefined) throw new Error('A rule was not judged.');
    const result = { ...describeStudy(study), ...compareTrial(standing, draft) };
    writeLine(response, { result: ruleTrialSchema.parse(result) });
  } catch (error) {
    if (gone.signal.aborted) return;
    // The answer has begun: what went wrong is its last line.
    request.log.error({ err: error }, 'a rule could not be tried');
    writeLine(response, { problem: new AppError('INTERNAL').problem });
  } finally {
    underWay -= 1;
    response.end();
  }
}

function describeStudy({ id, reviewCase, massing, year }: Study) {
  return {
    study: id,
    caseReference: reviewCase.number ?? reviewCase.draftKey,
    revision: massing.revision,
    year,
  };
}

function writeLine(response: Response, line: TrialLine): void {
  response.write(`${JSON.stringify(line)}\n`);
}
