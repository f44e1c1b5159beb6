import { readFile, writeFile } from 'node:fs/promises';
import { difference, type Geom } from 'polyclip-ts';
import { loadClipper } from '../../api/clipper.ts';
import { computeStudy } from '../../shared/study/compute-study.ts';
import { lightAtInstant } from '../../shared/study/instant-light.ts';
import { buildScene } from '../../shared/study/scene.ts';
import { readLarkhavenInput } from './larkhaven-input.ts';

const rounds = 5;
const resultsPath = new URL('RESULTS.md', import.meta.url);

const milliseconds = async (work: () => unknown): Promise<number> => {
  const startedMs = performance.now();
  await work();
  return performance.now() - startedMs;
};

const median = (values: number[]): number =>
  values.toSorted((a, b) => a - b)[Math.floor(values.length / 2)] ?? NaN;

const input = await readLarkhavenInput();
const clipper = await loadClipper();

const studyMs: number[] = [];
let evidence = (await computeStudy(input, { clipper })).evidence;
for (let round = 0; round < rounds; round += 1) {
  studyMs.push(
    await milliseconds(async () => {
      ({ evidence } = await computeStudy(input, { clipper }));
    }),
  );
}

// One instant, sun after on every receptor: the sweep beside polyclip-ts on the same contours. Only
// the time is compared here; that both give the same areas is shown in test/reference/shadow.
const scene = buildScene(input);
const noonMs = Date.parse('2026-12-21T12:00:00-06:00');
const sweepMs: number[] = [];
const polyclipMs: number[] = [];
let failed = 0;
for (let round = 0; round < 3; round += 1) {
  const instant = lightAtInstant(scene, scene.blocks, input, noonMs);
  const layer = instant.layerOn(0);
  if (layer === null) throw new Error('The sun is down at noon.');
  sweepMs.push(
    await milliseconds(() => {
      for (const receptor of scene.receptors) {
        instant.lightOn(receptor, 0);
      }
    }),
  );
  polyclipMs.push(
    await milliseconds(() => {
      scene.receptors.forEach((receptor) => {
        const shadows = layer
          .near(receptor.area.box)
          .filter(({ role }) => role !== 'existing')
          .flatMap(({ contours }) => contours.map((ring): Geom => [ring.map(toPair)]));
        const [shell = []] = receptor.area.rings;
        try {
          difference([shell.map(toPair)], ...shadows);
        } catch {
          failed += 1;
        }
      });
    }),
  );
}

const { blocks, receptors, instants = [] } = evidence;
const table = `| what | figure |
| --- | --- |
| blocks, receptors, listed instants | ${blocks.features.length}, ${receptors.features.length}, ${instants.length} |
| a whole study: median of ${rounds}, least, largest | ${median(studyMs).toFixed(0)} ms, ${Math.min(...studyMs).toFixed(0)} ms, ${Math.max(...studyMs).toFixed(0)} ms |
| sun after on every receptor at one instant: the sweep, median | ${median(sweepMs).toFixed(1)} ms |
| the same by polyclip-ts on the same contours, median | ${median(polyclipMs).toFixed(0)} ms |
| polyclip-ts over the sweep | ${(median(polyclipMs) / median(sweepMs)).toFixed(0)} times |
| receptors on which polyclip-ts threw | ${failed} |
| sweep against Clipper2 in the study | ${evidence.results.check?.largestDifferenceM2 ?? 'none'} m² |
`;
console.log(table);
if (process.argv.includes('--write')) {
  const heading = await readFile(resultsPath, 'utf8').then(
    (text) => text.slice(0, text.indexOf('| what |')),
    () => '',
  );
  await writeFile(resultsPath, heading + table);
}

function toPair(point: readonly [number, number]): [number, number] {
  return [point[0], point[1]];
}
