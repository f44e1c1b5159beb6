import type { EntityManager } from '@mikro-orm/postgresql';
import { polygonalSchema, type Polygonal } from '../../../shared/geometry/geojson-schema.ts';
import type { MassingBlock } from '../../../shared/massing/massing-block.ts';
import type { Rule } from '../../../shared/rules/rule-schema.ts';
import { evidenceFormat } from '../../../shared/study/evidence-schema.ts';
import type { EvidenceBlock, StudyInput } from '../../../shared/study/evidence-schema.ts';
import { listJudgedDays } from '../../../shared/study/judged-days.ts';
import { listKeyDateInstants } from '../../../shared/study/key-date-instants.ts';
import { readStudyInput } from '../../../shared/study/read-study-input.ts';
import type { InputIssue } from '../../../shared/study/read-study-input.ts';
import {
  findExtremeHeights,
  listBuildingBlocks,
  listReceptors,
} from '../base-data/site-surroundings-queries.ts';
import type { Municipality } from '../settings/municipality.entity.ts';
import { placeOf } from './study-place.ts';
import { computeStudyReach } from './study-reach.ts';

/** Base data, massing and rule do not make a valid study; the message is a sentence for the planner. */
export class StudyInputError extends Error {
  constructor(issues: readonly InputIssue[]) {
    const [first] = issues;
    const others = issues.length > 1 ? ` (and ${issues.length - 1} more)` : '';
    super(
      `The study cannot be computed from these data: ${first?.path ?? ''}: ${first?.message ?? ''}${others}.`,
    );
  }
}

interface StudySubject {
  /** The site's parcels, dissolved. */
  site: Polygonal;
  siteParcels: readonly string[];
  blocks: readonly MassingBlock[];
  municipality: Municipality;
  rule: Rule;
  year: number;
}

/**
 * Puts together what a study is computed from: the revision's blocks, the base data within reach of the
 * site, the municipality's place and the rule. The same data gives the same input, to the order of its parts.
 *
 * @throws StudyInputError where base data, massing and rule do not make a valid study
 */
export async function buildStudyInput(
  em: EntityManager,
  { site, siteParcels, blocks, municipality, rule, year }: StudySubject,
): Promise<StudyInput> {
  const place = placeOf(municipality);
  const instants = listKeyDateInstants(place, year);
  const judgedEnds = listJudgedDays(rule, place, year).flatMap(({ days }) =>
    days.flatMap(({ fromAt, toAt }) => [fromAt, toAt]),
  );
  const heights = await findExtremeHeights(em, site);
  const reach = computeStudyReach([...instants, ...judgedEnds], place, {
    ...heights,
    siteTopM: Math.max(heights.siteTopM, ...blocks.map(({ topM }) => topM)),
  });
  const declared = blocks.filter(({ role }) => role === 'existing');
  const reading = readStudyInput({
    format: evidenceFormat,
    place,
    site,
    blocks: {
      features: [
        ...(await listBuildingBlocks(em, {
          site,
          declared,
          reach,
          idPrefix: choosePrefix(blocks),
        })),
        ...blocks.map(toEvidenceBlock),
      ],
    },
    receptors: { features: await listReceptors(em, site, siteParcels, reach) },
    year,
    instants,
    rule,
  });
  if (!reading.ok) throw new StudyInputError(reading.issues);
  return reading.input;
}

/** Base data gets a prefix that no block of the massing has: the applicant is free to use the same ids. */
function choosePrefix(blocks: readonly MassingBlock[]): string {
  let prefix = 'building:';
  while (blocks.some(({ id }) => id.startsWith(prefix))) prefix = `base-${prefix}`;
  return prefix;
}

function toEvidenceBlock({ id, role, baseM, topM, geometry }: MassingBlock): EvidenceBlock {
  return {
    type: 'Feature',
    properties: { id, role, base: baseM, top: topM },
    geometry: polygonalSchema.parse(geometry),
  };
}
