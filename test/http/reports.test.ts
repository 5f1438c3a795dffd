import { createHash } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { ReportDeliveriesService } from '../../src/features/reports/report-deliveries.service.ts';
import { ReportRepository } from '../../src/features/reports/reports.repository.ts';
import { ReportsService } from '../../src/features/reports/reports.service.ts';
import { SquadsService } from '../../src/features/squads/squads.service.ts';
import { MailTransport } from '../../src/platform/mail/mail-transport.ts';
import type { MailReceipt, OutgoingMail } from '../../src/platform/mail/mail-transport.ts';
import { UnavailableError } from '../../src/platform/errors.ts';
import { UnitOfWork } from '../../src/platform/unit-of-work.ts';
import { startTestApp } from '../support/app.ts';
import type { TestApp, TestClub } from '../support/app.ts';
import { fixedClock } from '../support/clock.ts';
import { readWorkbook } from '../support/workbook.ts';

interface Named {
  id: string;
  name: string;
  version: number;
}

let app: TestApp;
let club: TestClub;
let manager: string;
let coach: { personId: string; token: string };
let squadId: string;
let athleteId: string;
let sessionId: string;

const WEEK = Array.from({ length: 7 }, (_, i) => new Date(Date.UTC(2026, 1, 23 + i)).toISOString().slice(0, 10));

beforeAll(async () => {
  app = await startTestApp({ clock: fixedClock('2026-03-02T12:00:00Z') });
  club = await app.newClub();
  manager = (await club.person([{ role: 'manager' }])).token;
  squadId = await club.squad('Žluté veslo & "Co"');
  coach = await club.person([{ role: 'coach', squadId }], 'Cora Coach');
  athleteId = (await club.athlete(squadId, { name: '=Anna', memberFrom: '2026-02-23' })).athleteId;
  await club.athlete(squadId, { name: 'Běla', memberFrom: '2026-02-23' });
  const body = { startedAt: `${WEEK[1]!}T09:00:00+01:00`, durationMin: 60, modality: 'rowing', rating: 5 };
  const session = await app.api('POST', `/v1/athletes/${athleteId}/sessions`, { token: manager, body });
  sessionId = (session.body as Named).id;
  for (const day of WEEK) {
    const closing = await app.api('POST', `/v1/squads/${squadId}/days/${day}/closing`, { token: manager, body: {} });
    expect(closing.status).toBe(200);
  }
});
afterAll(() => app.close());

const make = (body: object = { isoWeek: '2026-W09' }, token = manager) =>
  app.api('POST', `/v1/squads/${squadId}/reports`, { token, body });
const get = (path: string, token = coach.token) => app.api('GET', path, { token });
async function workbook(reportId: string): Promise<{ response: Response; content: Buffer }> {
  const headers = { authorization: `Bearer ${coach.token}` };
  const response = await fetch(`${app.url}/v1/reports/${reportId}/workbook`, { headers });
  return { response, content: Buffer.from(await response.arrayBuffer()) };
}

describe('the record', () => {
  let first: string;

  test('two who ask at the same moment get the same report, made once', async () => {
    const answers = await Promise.all([make(), make(), make()]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 200, 201]);
    const ids = new Set(answers.map(({ body }) => (body as Named).id));
    expect(ids.size).toBe(1);
    first = [...ids][0]!;
    expect(answers[0].body).toMatchObject({
      isoWeek: '2026-W09',
      version: 1,
      asOf: '2026-03-01',
      change: null,
      files: [{ name: 'loadweir-zlute-veslo-co-2026-W09-v1.xlsx', path: `/v1/reports/${first}/workbook` }],
    });
    expect((await get(`/v1/squads/${squadId}/reports`)).body.items).toHaveLength(1);
  });

  test('says what it knows and withholds the rest with the reason', async () => {
    const { body } = await get(`/v1/reports/${first}`);
    expect(body.view).toMatchObject({
      headline: 'The log is too thin to say who needs a talk.',
      asOf: '2026-03-01',
      readOn: '2026-03-02',
    });
    expect(body.view.changes.since).toBeNull();
    const anna = (body.view as { measures: (Named & { longLoad: { units: number } })[] }).measures.find(
      ({ name }) => name === '=Anna',
    );
    expect(anna).toMatchObject({
      primaryMeasure: 'rating-load',
      ratingLoad: { week: { value: 300 }, weekKnownDays: 7 },
      ratio: { value: null, instead: '7 of 28 days known' },
      longLoad: { value: null, instead: '7 of 56 days in' },
    });
    expect(anna!.longLoad.units).toBeGreaterThan(0);
  });

  test('the workbook is served with its name, its tag, and text that stays text', async () => {
    const { response, content } = await workbook(first);
    expect(response.headers.get('content-type')).toContain('spreadsheetml.sheet');
    expect(response.headers.get('content-disposition')).toContain('loadweir-zlute-veslo-co-2026-W09-v1.xlsx');
    const hash = createHash('sha256').update(content).digest('hex');
    expect(response.headers.get('etag')).toBe(`"${hash}"`);
    const { names, table } = await readWorkbook(content);
    expect(names).toEqual(['Monday', 'Measures', 'Method']);
    expect(table('Measures').value('=Anna', 'Rating load, week')).toBe(300);
    expect(table('Monday').value('=Anna', 'Done of')).toBe('1 · no plan');
  });

  test('a correction makes a new version that says what differs; the first one stays as it was', async () => {
    const before = (await workbook(first)).content;
    const path = `/v1/sessions/${sessionId}`;
    const body = { startedAt: `${WEEK[1]!}T09:00:00+01:00`, durationMin: 60, modality: 'rowing', rating: 7 };
    const put = await app.api('PUT', path, {
      token: manager,
      body: { ...body, changeReason: 'rating misread' },
      headers: { 'if-match': '"v1"' },
    });
    expect(put.status).toBe(200);
    const second = await make({ isoWeek: '2026-W09', change: 'Rating of Tuesday corrected' });
    expect(second).toMatchObject({ status: 201, body: { version: 2 } });
    expect(second.body.change).toMatch(/^Rating of Tuesday corrected · =Anna: rating load 300 → 420/);
    expect((await workbook(first)).content.equals(before)).toBe(true);
    const { table } = await readWorkbook((await workbook((second.body as Named).id)).content);
    expect(table('Monday').sheet.getCell(5, 1).value).toMatch(/^Version 2\. Rating of Tuesday corrected/);
    expect(await make()).toMatchObject({ status: 200, body: { version: 2 } });
    const { items } = (await get(`/v1/squads/${squadId}/reports`)).body as { items: Named[] };
    expect(items.map(({ version }) => version)).toEqual([2, 1]);
  });

  test('the week after is compared with this one', async () => {
    const next = await make({ isoWeek: '2026-W10' });
    expect(next.status).toBe(201);
    const { view } = (await get(`/v1/reports/${next.body.id}`)).body;
    expect(view).toMatchObject({ changes: { since: '2026-W09' }, line: { closedDays: 0 } });
    expect(view.headline).toBe('The log is too thin to say who needs a talk. No day of this week is closed yet.');
  });

  test.each([
    ['2026-W11', 422],
    ['2026-W54', 400],
    ['2025-W53', 422],
    ['week 9', 400],
  ])('%s is refused', async (isoWeek, status) => {
    expect((await make({ isoWeek })).status).toBe(status);
  });

  test('coaches read, managers make, others see nothing', async () => {
    expect((await make({ isoWeek: '2026-W09' }, coach.token)).status).toBe(403);
    const elsewhere = await club.person([{ role: 'coach', squadId: await club.squad() }]);
    const staff = await club.person([{ role: 'staff', squadId }]);
    for (const path of ['', '/workbook', '/deliveries']) {
      expect((await get(`/v1/reports/${first}${path}`, elsewhere.token)).status).toBe(404);
      expect((await get(`/v1/reports/${first}${path}`, staff.token)).status).toBe(403);
      expect((await get(`/v1/reports/${first}${path}`)).status).toBe(200);
    }
  });
});

describe('delivery', () => {
  class Postman extends MailTransport {
    readonly sent: OutgoingMail[] = [];
    deferred: string | undefined;
    constructor(public fault: 'none' | 'unreachable' | 'refused' = 'none') {
      super();
    }
    async send(mail: OutgoingMail): Promise<MailReceipt> {
      if (this.fault === 'unreachable') throw new UnavailableError('no route to the mail server');
      if (mail.to[0] === this.deferred) throw new UnavailableError('mailbox full, try later');
      if (this.fault === 'refused') return { accepted: false, detail: '550 no such person' };
      this.sent.push(mail);
      return { accepted: true, detail: '250 ok' };
    }
  }

  const inUnit = <T>(work: () => Promise<T>): Promise<T> =>
    app.app.get(UnitOfWork, { strict: false }).run({ clubId: club.clubId, personId: null }, work);
  const service = (postman: MailTransport): ReportDeliveriesService =>
    new ReportDeliveriesService(
      app.app.get(ReportRepository, { strict: false }),
      app.app.get(ReportsService, { strict: false }),
      app.app.get(SquadsService, { strict: false }),
      postman,
      app.clock,
      { MAIL_FROM: 'Loadweir <reports@club.example>' },
    );
  const newest = async (): Promise<string> => ((await make()).body as Named).id;

  test('a server out of reach leaves the mail waiting; the next try sends it, a third sends nothing', async () => {
    const reportId = await newest();
    const postman = new Postman('unreachable');
    await expect(service(postman).deliver(reportId, inUnit)).rejects.toThrow('no route');
    expect((await get(`/v1/reports/${reportId}/deliveries`)).body.items).toMatchObject([
      { personId: coach.personId, state: 'waiting', sentAt: null },
    ]);
    postman.fault = 'none';
    expect(await service(postman).deliver(reportId, inUnit)).toEqual({ waiting: 0, sent: 1, failed: 0 });
    expect(await service(postman).deliver(reportId, inUnit)).toEqual({ waiting: 0, sent: 1, failed: 0 });
    expect(postman.sent).toHaveLength(1);
    const [mail] = postman.sent;
    expect(mail).toMatchObject({
      messageId: `<report.${reportId}.${coach.personId}@club.example>`,
      subject: 'Žluté veslo & "Co", week 9: too thin a log to judge (version 2)',
      attachments: [{ filename: 'loadweir-zlute-veslo-co-2026-W09-v2.xlsx' }],
    });
    expect(mail!.attachments[0]!.content.equals((await workbook(reportId)).content)).toBe(true);
  });

  test('two workers at the same moment send each mail once', async () => {
    const { body } = await make({ isoWeek: '2026-W08' });
    const postman = new Postman();
    await Promise.all([1, 2, 3].map(() => service(postman).deliver((body as Named).id, inUnit)));
    expect(postman.sent).toHaveLength(1);
  });

  test('a refusal is kept as an answer and not tried again', async () => {
    const second = await club.person([{ role: 'coach' }], 'Club-wide Coach');
    // Compared with a week before that has its report now, this week says something new: version 3.
    const reportId = await newest();
    const postman = new Postman('refused');
    expect(await service(postman).deliver(reportId, inUnit)).toEqual({ waiting: 0, sent: 0, failed: 2 });
    postman.fault = 'none';
    expect(await service(postman).deliver(reportId, inUnit)).toMatchObject({ sent: 0, failed: 2 });
    expect(postman.sent).toEqual([]);
    const { items } = (await get(`/v1/reports/${reportId}/deliveries`)).body;
    expect(items).toContainEqual(
      expect.objectContaining({ personId: second.personId, state: 'failed', detail: '550 no such person' }),
    );
  });

  test('one coach whose server wants to wait does not keep the others waiting', async () => {
    const { body } = await make({ isoWeek: '2026-W07' });
    const reportId = (body as Named).id;
    const waiting = async () =>
      (await get(`/v1/reports/${reportId}/deliveries`)).body.items as { state: string; email: string }[];
    await inUnit(() => service(new Postman()).prepare(reportId));
    const postman = new Postman();
    postman.deferred = (await waiting())[0]!.email;
    await expect(service(postman).deliver(reportId, inUnit)).rejects.toThrow('try later');
    const states = (await waiting()).map(({ state }) => state);
    expect(states[0]).toBe('waiting');
    expect(states.slice(1)).toEqual(states.slice(1).map(() => 'sent'));
    expect(states.length).toBeGreaterThan(1);
  });
});
