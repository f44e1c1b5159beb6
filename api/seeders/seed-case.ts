import type { MikroORM } from '@mikro-orm/postgresql';
import type PgBoss from 'pg-boss';
import type { Logger } from 'pino';
import type { CaseState } from '../../shared/contracts/case-life.ts';
import type { Clipper } from '../../shared/shadow/clipper.ts';
import { changeCaseState } from '../modules/cases/change-case-state.ts';
import { createCase } from '../modules/cases/create-case.ts';
import { createComment } from '../modules/comments/create-comment.ts';
import { moderateComment } from '../modules/comments/moderate-comment.ts';
import { createMassing } from '../modules/massings/create-massing.ts';
import { Person } from '../modules/people/person.entity.ts';
import { issueReport } from '../modules/reports/issue-report.ts';
import { requestStudy } from '../modules/studies/request-study.ts';
import { runStudy } from '../modules/studies/run-study.ts';
import { Study } from '../modules/studies/study.entity.ts';
import { readSampleMassing } from './read-sample-data.ts';
import type { SampleCase } from './read-sample-data.ts';
import { demoAddressOf } from './seed-people.ts';

export interface Stage {
  orm: MikroORM;
  queue: PgBoss;
  clipper: Clipper;
  logger: Logger;
  publicUrl: string;
}

/** The way of a case that goes well, state by state. */
const way = [
  'submitted',
  'complete',
  'under-review',
  'open-for-comment',
  'report-issued',
  'heard',
  'approved',
] as const satisfies readonly CaseState[];

/** Plays a case up to its state with the use-cases that people's requests call, so that all of it is real. */
export async function seedCase(stage: Stage, sample: SampleCase): Promise<void> {
  const applicant = await stage.orm.em.fork().findOneOrFail(Person, { name: sample.applicant });
  const planner = await stage.orm.em.fork().findOneOrFail(Person, { role: 'planner' });
  const { title, description, siteParcels } = sample;
  const created = await createCase(stage.orm.em.fork(), applicant, {
    title,
    description,
    siteParcels,
  });
  const play = new CasePlay(stage, sample, created.draftKey, applicant, planner);
  for (const { file, sentBackReason } of sample.massings) {
    await play.upload(file);
    if (sentBackReason === null) {
      await play.goTo(sample.state);
    } else {
      await play.goTo('under-review');
      await play.sendBack(sentBackReason);
    }
  }
}

class CasePlay {
  constructor(
    private readonly stage: Stage,
    private readonly sample: SampleCase,
    private readonly reference: string,
    private readonly applicant: Person,
    private readonly planner: Person,
  ) {}

  async upload(file: string): Promise<void> {
    const upload = await readSampleMassing(file);
    await createMassing(this.em(), this.applicant, this.reference, upload);
  }

  async goTo(target: CaseState): Promise<void> {
    const last = way.findIndex((state) => state === target);
    for (const state of way.slice(0, last + 1)) {
      if (state === 'report-issued') await this.report();
      await this.change(state, state === 'approved' ? 'The board found the rule met.' : undefined);
      if (state === 'under-review') await this.study();
      if (state === 'open-for-comment') await this.comment();
    }
  }

  async sendBack(reason: string): Promise<void> {
    await this.change('sent-back', reason);
  }

  private async change(to: CaseState, reason?: string): Promise<void> {
    const actor = to === 'submitted' ? this.applicant : this.planner;
    await changeCaseState(this.em(), actor, this.reference, { to, reason }, new Date());
  }

  private async study(): Promise<void> {
    const { id } = await requestStudy(this.em(), this.stage.queue, this.planner, this.reference);
    await runStudy(id, { ...this.stage, stopping: new AbortController().signal });
    const study = await this.em().findOneOrFail(Study, id);
    if (study.status !== 'finished') {
      throw new Error(`The study of ${this.sample.title} ended as ${study.status}.`);
    }
  }

  /** The last comment is left for the planner to look at. */
  private async comment(): Promise<void> {
    const { comments } = this.sample;
    for (const [index, { author, text, pin }] of comments.entries()) {
      const { id } = await createComment(this.em(), null, this.reference, {
        authorName: author,
        authorEmail: demoAddressOf(author),
        body: text,
        pin,
      });
      if (index < comments.length - 1) {
        await moderateComment(this.em(), this.planner, id, { state: 'published' });
      }
    }
  }

  private async report(): Promise<void> {
    await issueReport(this.em(), {
      actor: this.planner,
      reference: this.reference,
      input: {
        narrative:
          'The study was run on the massing as submitted, with the buildings of the municipal register around it.',
        recommendation: 'Approve as submitted.',
      },
      publicUrl: this.stage.publicUrl,
    });
  }

  private em() {
    return this.stage.orm.em.fork();
  }
}
