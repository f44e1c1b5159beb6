import { readFile, writeFile } from 'node:fs/promises';
import { loadClipper } from '../../api/clipper.ts';
import { computeStudy } from '../../shared/study/compute-study.ts';
import type { StudyInput } from '../../shared/study/evidence-schema.ts';
import { compareAreas } from './areas-section.ts';
import { benchBrowserWorker, describeBrowserWorker } from './browser-worker.ts';
import {
  growthWithBlocks,
  growthWithInstants,
  growthWithReceptors,
  naiveGrowth,
} from './growth-section.ts';
import { readLarkhavenInput } from './larkhaven-input.ts';
import { median, say, table } from './measuring.ts';
import { makeTown } from './town.ts';

const rounds = 5;
const resultsPath = new URL('RESULTS.md', import.meta.url);
const measuredHeading = '## Whole studies';

const clipper = await loadClipper();
const town = makeTown(1200);

const sections: [string, () => string | Promise<string>][] = [
  [measuredHeading, () => wholeStudies()],
  ['## Areas, side by side', () => compareAreas(clipper, town)],
  ['## Growth with buildings', growthWithBlocks],
  ['## Growth with receptors', () => growthWithReceptors(town)],
  ['## Growth with instants', () => growthWithInstants(clipper, town)],
  ['## The naive pipeline', naiveGrowth],
  ["## In the browser's worker", async () => describeBrowserWorker(await benchBrowserWorker())],
];
const parts: string[] = [];
for (const [heading, measure] of sections) {
  const part = `${heading}\n\n${await measure()}`;
  console.log(`${part}\n`);
  parts.push(part);
}
if (process.argv.includes('--write')) {
  const before = (await readFile(resultsPath, 'utf8')).split(measuredHeading)[0] ?? '';
  await writeFile(resultsPath, `${before}${parts.join('\n\n')}\n`);
}

/** Figures, drawings, findings and digest. */
async function wholeStudies(): Promise<string> {
  const studies: [string, StudyInput][] = [
    ['Tallow Wharf Lofts among all of Larkhaven', await readLarkhavenInput()],
    ['the generated town', town],
  ];
  const rows: string[][] = [];
  for (const [name, input] of studies) {
    let difference = 'none';
    const times: number[] = [];
    for (let round = 0; round < rounds; round += 1) {
      const startedMs = performance.now();
      const { evidence } = await computeStudy(input, { clipper });
      times.push(performance.now() - startedMs);
      difference = String(evidence.results.check?.largestDifferenceM2 ?? 'none');
    }
    rows.push([
      name,
      String(input.blocks.features.length),
      String(input.receptors.features.length),
      String(input.instants?.length ?? 0),
      say(median(times)),
      say(Math.min(...times)),
      say(Math.max(...times)),
      difference,
    ]);
  }
  return table(
    [
      'study',
      'blocks',
      'receptors',
      'instants',
      'median ms',
      'least',
      'largest',
      'sweep against Clipper2, m²',
    ],
    rows,
  );
}
