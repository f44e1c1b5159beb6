import { parentPort, workerData } from 'node:worker_threads';
import { z } from 'zod';
import { ruleSchema } from '../../../shared/rules/rule-schema.ts';
import { computeStudy } from '../../../shared/study/compute-study.ts';
import { studyInputSchema } from '../../../shared/study/evidence-schema.ts';
import { loadClipper } from '../../clipper.ts';
import { listFindingRows } from '../studies/list-finding-rows.ts';

const startSchema = z.object({ input: studyInputSchema, rules: z.array(ruleSchema).min(1) });

/** At most so often is told how far it is. */
const tellEveryMs = 150;

/** The thread of `judgeRulesApart`: judges one case by each rule in turn, tells how far it is, and ends. */
const { input, rules } = startSchema.parse(workerData);
const clipper = await loadClipper();
const judged = [];
let doneBefore = 0;
for (const [index, rule] of rules.entries()) {
  let lastMs = -Infinity;
  let instants = 0;
  const { evidence } = await computeStudy(
    // What is drawn is not asked for: the judged instants come from the rule.
    { ...input, rule, instants: [] },
    {
      clipper,
      onProgress: (done, total) => {
        instants = total;
        if (performance.now() - lastMs < tellEveryMs && done < total) return;
        lastMs = performance.now();
        // Of the rules to come nothing is known yet; they are taken to be as long.
        const totalOfAll = doneBefore + total * (rules.length - index);
        parentPort?.postMessage({ progress: { done: doneBefore + done, total: totalOfAll } });
      },
    },
  );
  doneBefore += instants;
  judged.push({ rule, findings: evidence.results.findings, rows: listFindingRows(evidence) });
}
parentPort?.postMessage({ judged });
