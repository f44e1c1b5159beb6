import { readFile } from 'node:fs/promises';
import { parseArgs } from 'node:util';
import { compareResults } from '../../shared/study/compare-evidence.ts';
import {
  computeListedInstants,
  computeStudy,
  type InstantShadowPolygons,
} from '../../shared/study/compute-study.ts';
import { digestOf } from '../../shared/study/digest.ts';
import { engineVersion } from '../../shared/study/engine-version.ts';
import {
  evidenceFileSchema,
  type StudyInput,
  type StudyInstant,
} from '../../shared/study/evidence-schema.ts';
import { readStudyInput, type InputIssue } from '../../shared/study/read-study-input.ts';
import { loadClipper } from '../clipper.ts';
import { makeShadowsValid } from '../valid-polygons.ts';

const exitCodes = { done: 0, different: 1, invalid: 2, lastDigits: 3, otherEngine: 4 } as const;

const usage = `Recomputes a study from its file, without a server and without a database.

  npm run --silent recompute -- input.study.json               the completed evidence file to stdout
  npm run --silent recompute -- evidence.study.json --verify   exit 0 when the digest is the same
    --at 2026-12-21T12:00:00-06:00   that instant alone
    --shadows                        with the shadow polygons of each instant

Exit codes: 0 done or verified, 1 the results differ, 2 not a valid study, 3 only last rounded
digits differ, 4 made by another engine version.
`;

// A reader that has seen enough, such as `head`, closes the pipe: that is no error.
process.stdout.on('error', () => process.exit(exitCodes.done));

process.exitCode = await main(process.argv.slice(2));

async function main(args: string[]): Promise<number> {
  let options;
  try {
    options = parseArgs({
      args,
      allowPositionals: true,
      options: {
        verify: { type: 'boolean', default: false },
        at: { type: 'string' },
        shadows: { type: 'boolean', default: false },
        help: { type: 'boolean', default: false },
      },
    });
  } catch (error) {
    return refuse([{ path: '', message: error instanceof Error ? error.message : String(error) }]);
  }
  const [path, ...more] = options.positionals;
  const { verify, at, shadows, help } = options.values;
  if (help) {
    process.stdout.write(usage);
    return exitCodes.done;
  }
  if (path === undefined || more.length > 0) {
    process.stderr.write(usage);
    return exitCodes.invalid;
  }
  const file = await readJson(path);
  if (!file.ok) return refuse(file.issues);
  if (verify) return verifyEvidence(file.value);
  const read = readStudyInput(withoutResults(file.value));
  if (!read.ok) return refuse(read.issues);
  if (at !== undefined) return printInstant(read.input, at, shadows);
  const study = await computeStudy(read.input, { clipper: await loadClipper() });
  if (!shadows) return print(study.evidence);
  const { digest: _digest, results, ...rest } = study.evidence;
  const instants = await withShadows(results.instants, study.shadows);
  return print({ ...rest, results: { ...results, instants } });
}

async function verifyEvidence(value: unknown): Promise<number> {
  const stored = evidenceFileSchema.safeParse(value);
  if (!stored.success) {
    return refuse(
      stored.error.issues.map((issue) => ({
        path: issue.path.map(String).join('.'),
        message: issue.message,
      })),
    );
  }
  if (stored.data.engine !== engineVersion) {
    process.stderr.write(
      `The file was made by engine ${stored.data.engine}; this is engine ${engineVersion}.\n`,
    );
    return exitCodes.otherEngine;
  }
  const read = readStudyInput(withoutResults(value));
  if (!read.ok) return refuse(read.issues);
  const { evidence } = await computeStudy(read.input, { clipper: await loadClipper() });
  const comparison = compareResults(stored.data.results, evidence.results);
  if (comparison.kind !== 'same') {
    process.stderr.write(`${comparison.path}: ${comparison.message}\n`);
    return comparison.kind === 'different' ? exitCodes.different : exitCodes.lastDigits;
  }
  if (stored.data.digest !== digestOf(stored.data) || stored.data.digest !== evidence.digest) {
    process.stderr.write(
      `digest: the file says ${stored.data.digest}, its content gives ${evidence.digest}\n`,
    );
    return exitCodes.different;
  }
  process.stdout.write(`Verified: ${evidence.digest}\n`);
  return exitCodes.done;
}

async function printInstant(input: StudyInput, at: string, shadows: boolean): Promise<number> {
  const checked = readStudyInput({ ...input, instants: [at] });
  if (!checked.ok) return refuse([{ path: '--at', message: 'write an instant with its offset' }]);
  const light = await computeListedInstants(checked.input, { clipper: await loadClipper() });
  return print({
    ...checked.input,
    engine: engineVersion,
    results: {
      instants: shadows ? await withShadows(light.instants, light.shadows) : light.instants,
      receptors: light.receptors,
    },
  });
}

/** Adds to each instant its polygons, valid ones, or null with the sun down. */
async function withShadows(
  instants: readonly StudyInstant[],
  shadows: readonly InstantShadowPolygons[],
) {
  const drawn = new Map(shadows.map((one) => [one.at, one]));
  return Promise.all(
    instants.map(async (instant) => {
      const found = drawn.get(instant.at);
      if (found === undefined) return { ...instant, shadows: null };
      const { before, after, netNew } = await makeShadowsValid(found);
      return { ...instant, shadows: { before, after, netNew } };
    }),
  );
}

type ReadJson = { ok: true; value: unknown } | { ok: false; issues: InputIssue[] };

async function readJson(path: string): Promise<ReadJson> {
  try {
    const value: unknown = JSON.parse(await readFile(path, 'utf8'));
    return { ok: true, value };
  } catch (error) {
    const message = error instanceof Error ? error.message : String(error);
    return { ok: false, issues: [{ path, message }] };
  }
}

/** An evidence file's input; anything else is left for the schema to refuse. */
function withoutResults(value: unknown): unknown {
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value).filter(
      ([member]) => member !== 'results' && member !== 'digest' && member !== 'engine',
    ),
  );
}

function print(value: unknown): number {
  process.stdout.write(`${JSON.stringify(value)}\n`);
  return exitCodes.done;
}

function refuse(issues: readonly InputIssue[]): number {
  for (const { path, message } of issues) process.stderr.write(`${path}: ${message}\n`);
  return exitCodes.invalid;
}
