import { setImmediate as nextTurn } from 'node:timers/promises';
import type { EntityManager } from '@mikro-orm/postgresql';
import { isPolygonal } from '../../../shared/geometry/geojson-schema.ts';
import { keyDatesOfYear } from '../../../shared/solar/key-dates.ts';
import type { EvidenceFile, StudyInput } from '../../../shared/study/evidence-schema.ts';
import { listJudgedDays } from '../../../shared/study/judged-days.ts';
import { computeReceptorLedger } from '../../../shared/study/receptor-ledger.ts';
import { Parcel } from '../base-data/parcel.entity.ts';
import { presentParcel } from '../base-data/parcel.presenter.ts';
import { measureParcels } from '../base-data/spatial-queries.ts';
import type { ReviewCase } from '../cases/review-case.entity.ts';
import { Comment } from '../comments/comment.entity.ts';
import { presentBlocks } from '../massings/massing.presenter.ts';
import type { Municipality } from '../settings/municipality.entity.ts';
import { presentMunicipality } from '../settings/municipality.presenter.ts';
import { readEvidence } from '../studies/read-evidence.ts';
import { StudyInstant } from '../studies/study-instant.entity.ts';
import type { Study } from '../studies/study.entity.ts';
import { chooseLedgers } from './choose-ledgers.ts';
import { findSurroundings } from './find-surroundings.ts';
import { chooseMapExtent } from './map-extent.ts';
import { reportPayloadSchema } from './report-payload.ts';
import type { ReportInstant, ReportPayload } from './report-payload.ts';

export interface ReportSubject {
  number: string;
  issuedAt: Date;
  issuedByName: string;
  /** With its applicant. */
  reviewCase: ReviewCase;
  /** Finished; with its massing's blocks, its evidence and its findings table. */
  study: Study;
  municipality: Municipality;
  publicUrl: string;
  narrative: string;
  recommendation: string;
}

/** Gathers all that a report prints as plain data. No figure is computed here but the sun ledgers, from the study's own input. */
export async function collectReport(
  em: EntityManager,
  subject: ReportSubject,
): Promise<ReportPayload> {
  const { reviewCase, study, municipality } = subject;
  const { massing } = study;
  const evidence = readEvidence(study);
  const findingRows = study.findingRows ?? [];
  const withLedger = chooseLedgers(findingRows);
  const mapExtent = chooseMapExtent([reviewCase.site], massing.figures.heightM ?? 0);
  const comments = await em.find(
    Comment,
    { reviewCase: reviewCase.id },
    { orderBy: { receivedAt: 'asc', id: 'asc' } },
  );
  return reportPayloadSchema.parse({
    payloadVersion: 1,
    number: subject.number,
    issuedAt: subject.issuedAt.toISOString(),
    issuedByName: subject.issuedByName,
    caseUrl: `${subject.publicUrl}/cases/${reviewCase.number ?? ''}`,
    evidenceUrl: `${subject.publicUrl}/api/studies/${study.id}/evidence`,
    municipality: presentMunicipality(municipality),
    reviewCase: {
      number: reviewCase.number,
      title: reviewCase.title,
      address: reviewCase.address,
      description: reviewCase.description,
      applicantName: reviewCase.applicant.name,
    },
    siteParcels: await listSiteParcels(em, reviewCase),
    site: evidence.site ?? reviewCase.site,
    revision: {
      revision: massing.revision,
      fileName: massing.fileName,
      sha256: massing.sha256,
      uploadedAt: massing.createdAt.toISOString(),
      figures: massing.figures,
      blocks: presentBlocks(massing.blocks),
    },
    mapExtent,
    surroundings: await findSurroundings(em, mapExtent),
    study: describeEvidence(evidence, study),
    instants: await listReportInstants(em, study),
    findingRows,
    receptors: evidence.receptors.features.flatMap(
      ({ properties: { id, class: receptorClass, label }, geometry }) =>
        // A window has no outline.
        withLedger.includes(id) && isPolygonal(geometry)
          ? [{ id, class: receptorClass, label, geometry }]
          : [],
    ),
    ledgers: await computeLedgers(evidence, withLedger),
    publishedComments: comments
      .filter(({ state }) => state === 'published')
      .map(({ authorName, body, receivedAt, revision, pin }) => ({
        authorName,
        body,
        receivedAt: receivedAt.toISOString(),
        revision: revision ?? null,
        pin: pin ?? null,
      })),
    withheldComments: comments.filter(({ state }) => state === 'withheld').length,
    narrative: subject.narrative,
    recommendation: subject.recommendation,
  });
}

async function listSiteParcels(
  em: EntityManager,
  { siteParcels }: ReviewCase,
): Promise<ReportPayload['siteParcels']> {
  const parcels = await em.find(
    Parcel,
    { number: { $in: siteParcels } },
    { orderBy: { number: 'asc' } },
  );
  const areas = await measureParcels(em, siteParcels);
  return parcels.map((parcel) => presentParcel(parcel, areas.get(parcel.number) ?? 0));
}

function describeEvidence(evidence: EvidenceFile, study: Study): ReportPayload['study'] {
  const { rule, place, year, results } = evidence;
  return {
    digest: evidence.digest,
    engine: evidence.engine,
    finishedAt: (study.finishedAt ?? study.requestedAt).toISOString(),
    year,
    rule,
    judgedDays: listJudgedDays(rule, place, year),
    keyDates: keyDatesOfYear(year, place.timezone),
    findings: results.findings,
    linkeTurbidity: evidence.settings.beam.linkeTurbidity,
    largestDifferenceM2: results.check?.largestDifferenceM2 ?? null,
  };
}

/** The study's instants with the sun up, as they were drawn. */
async function listReportInstants(em: EntityManager, study: Study): Promise<ReportInstant[]> {
  const instants = await em.find(
    StudyInstant,
    { study: study.id },
    { orderBy: { at: 'asc' }, populate: ['shadows'] },
  );
  return instants.flatMap(({ atText, azimuthDeg, altitudeDeg, netNewM2, removedM2, shadows }) => {
    const drawn = new Map(
      shadows?.features.map(({ properties, geometry }) => [properties.kind, geometry]),
    );
    const [before, after, netNew] = [drawn.get('before'), drawn.get('after'), drawn.get('netNew')];
    if (before === undefined || after === undefined || netNew === undefined) return [];
    return [
      {
        at: atText,
        azimuthDeg,
        altitudeDeg,
        netNewM2: netNewM2 ?? 0,
        removedM2: removedM2 ?? 0,
        before,
        after,
        netNew,
      },
    ];
  });
}

async function computeLedgers(
  input: StudyInput,
  receptors: readonly string[],
): Promise<ReportPayload['ledgers']> {
  const ledgers: ReportPayload['ledgers'] = [];
  for (const receptor of receptors) {
    ledgers.push(computeReceptorLedger(input, receptor));
    // Each takes a while: others are served in between.
    await nextTurn();
  }
  return ledgers;
}
