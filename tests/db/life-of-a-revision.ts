import { randomUUID } from 'node:crypto';
import { type Actor, schema, withFirm } from '@strandnote/db';
import { eq } from '../support/drizzle.ts';
import { addBridge, addFirm, addSurvey, type Bridge, type Firm, type OpenDatabase, type Survey } from '../support/fixtures.ts';
import { addDraft, addRevision, approve, type Draft, issue, type Submitted, sourcesOf, submit } from '../support/report-fixtures.ts';

const { revisions } = schema;
export type State = (typeof schema.revisionStates)[number];

/** A revision on its way through its states, by the moves that there are. */
export class LifeOfARevision {
  constructor(
    readonly database: OpenDatabase,
    readonly firm: Firm,
    readonly bridge: Bridge,
    readonly survey: Survey,
    readonly draft: Draft,
  ) {}

  static async inFirm(database: OpenDatabase): Promise<LifeOfARevision> {
    const firm = await addFirm(database, 'Ashdown');
    const bridge = await addBridge(database.app, firm.engineer);
    const survey = await addSurvey(database.app, firm.engineer, bridge);
    return new LifeOfARevision(database, firm, bridge, survey, await addDraft(database.app, firm.engineer, firm, bridge, survey));
  }

  /** Another one, in a report of its own, brought into this state. */
  async another(state: State = 'draft'): Promise<LifeOfARevision> {
    const { database, firm, bridge, survey } = this;
    const draft = await addDraft(database.app, firm.engineer, firm, bridge, survey);
    const life = new LifeOfARevision(database, firm, bridge, survey, draft);
    await life.bringTo(state);
    return life;
  }

  private async bringTo(state: State): Promise<void> {
    if (state === 'draft') return;
    await this.submit();
    if (state === 'in check') return;
    if (state === 'returned') return void (await this.set({ state, returnedReason: 'No.' }));
    await this.approve();
    if (state === 'approved') return;
    await this.issue();
    if (state === 'superseded') await this.supersede();
    if (state === 'withdrawn') await this.withdraw();
  }

  as<Result>(actor: Actor, work: Parameters<typeof withFirm<Result>>[2]): Promise<Result> {
    return withFirm(this.database.app, actor, work);
  }

  set(change: Partial<typeof revisions.$inferInsert>, actor = this.firm.engineer) {
    const { revisionId } = this.draft;
    return this.as(actor, (tx) =>
      tx.update(revisions).set(change).where(eq(revisions.id, revisionId)).returning({ state: revisions.state }),
    );
  }

  submit(): Promise<Submitted> {
    const { database, firm, bridge, survey, draft } = this;
    return submit(database.app, firm.engineer, draft, sourcesOf(bridge, survey, draft.revisionId));
  }

  async approve(): Promise<boolean> {
    return approve(this.database.app, this.firm.checker, this.draft, await this.latest());
  }

  async issue() {
    return issue(this.database.app, this.firm.engineer, this.draft, await this.latest());
  }

  next(): Promise<Draft> {
    return this.as(this.firm.engineer, (tx) => addRevision(tx, this.firm.engineer, { ...this.draft, letter: 'B' }));
  }

  async supersede() {
    const { revisionId } = await this.next();
    return this.set({ state: 'superseded', supersededBy: revisionId, supersededAt: new Date() });
  }

  withdraw() {
    return this.set({ state: 'withdrawn', withdrawnAt: new Date(), withdrawnReason: 'Wrong.' });
  }

  /** A remark of the checker on this submission. @returns its identifier */
  async remark(submissionId: string): Promise<string> {
    const { firmId, checker } = this.firm;
    const id = randomUUID();
    const said = { revisionId: this.draft.revisionId, submissionId, text: 'Why?', authorUserId: checker.userId };
    await this.as(checker, (tx) => tx.insert(schema.checkComments).values({ firmId, id, ...said }));
    return id;
  }

  async latest(): Promise<Submitted> {
    const { rows } = await this.database.superuser.query(
      'select id, content_sha256 from submissions where revision_id = $1 order by number desc limit 1',
      [this.draft.revisionId],
    );
    return { submissionId: rows[0].id, contentSha256: rows[0].content_sha256 };
  }
}
