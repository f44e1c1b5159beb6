import { createHash } from 'node:crypto';
import type { EntityManager } from '@mikro-orm/postgresql';
import { checkMassing } from '../../../shared/massing/check-massing.ts';
import type { MassingBlock } from '../../../shared/massing/massing-block.ts';
import type { MassingIssue } from '../../../shared/massing/massing-issue.ts';
import { measureMassing } from '../../../shared/massing/measure-massing.ts';
import { readMassing } from '../../../shared/massing/read-massing.ts';
import type { UploadedFile } from '../../endpoint.ts';
import { AppError } from '../../errors.ts';
import type { Actor } from '../../policy.ts';
import { Parcel } from '../base-data/parcel.entity.ts';
import { getCaseFor } from '../cases/get-case.ts';
import { lockCaseFor } from '../cases/lock-case.ts';
import type { ReviewCase } from '../cases/review-case.entity.ts';
import { Person } from '../people/person.entity.ts';
import { getMunicipality } from '../settings/get-municipality.ts';
import { MassingRevision } from './massing-revision.entity.ts';

/**
 * Stores a massing file as the case's next revision, with what was read from it and what is wrong with it.
 * Throws MASSING_UNREADABLE, with every issue, where nothing can be read; then nothing is stored.
 */
export async function createMassing(
  em: EntityManager,
  actor: Actor,
  reference: string,
  file: UploadedFile,
): Promise<MassingRevision> {
  const seen = await getCaseFor(em, actor, reference, 'upload-massing');
  const fileName = cleanFileName(file.fileName);
  const { blocks, issues } = await readAndCheck(em, seen, fileName, file.bytes);

  return em.transactional(async (tx) => {
    const reviewCase = await lockCaseFor(tx, actor, seen.id, 'upload-massing');
    const latest = await tx.findOne(
      MassingRevision,
      { reviewCase: reviewCase.id },
      { orderBy: { revision: 'desc' } },
    );
    const revision = tx.create(MassingRevision, {
      reviewCase,
      revision: (latest?.revision ?? 0) + 1,
      fileName,
      original: file.bytes,
      sha256: createHash('sha256').update(file.bytes).digest('hex'),
      sizeBytes: file.bytes.length,
      uploadedBy: await tx.findOneOrFail(Person, actor.id),
      createdAt: new Date(),
      issues,
      blocks,
      figures: measureMassing(blocks),
      sound: issues.every(({ severity }) => severity !== 'error'),
    });
    await tx.flush();
    return revision;
  });
}

async function readAndCheck(
  em: EntityManager,
  reviewCase: ReviewCase,
  fileName: string,
  bytes: Buffer,
): Promise<{ blocks: MassingBlock[]; issues: MassingIssue[] }> {
  const reading = readMassing(bytes, fileName);
  if (!reading.ok) {
    throw new AppError('MASSING_UNREADABLE', {
      title:
        'The massing file could not be read, and nothing was stored. See below what to change.',
      errors: reading.issues.map(({ feature, message, suggestion }) => ({
        path: feature ?? 'file',
        message: `${message} ${suggestion}`.trim(),
      })),
    });
  }
  const municipality = await getMunicipality(em);
  const parcels = await em.find(Parcel, { number: { $in: reviewCase.siteParcels } });
  const checked = checkMassing(reading.blocks, {
    parcels: parcels.map(({ geometry }) => geometry),
    extent: municipality.extent,
    longitude: municipality.longitude,
    latitude: municipality.latitude,
  });
  return { blocks: reading.blocks, issues: [...reading.issues, ...checked] };
}

/** The name alone, without a path and without characters that no line of text has. */
function cleanFileName(name: string): string {
  const last = name.split(/[\\/]/).at(-1) ?? '';
  const printable = last.replace(/\p{Cc}/gu, '').trim();
  return printable === '' ? 'massing' : printable.slice(-255);
}
