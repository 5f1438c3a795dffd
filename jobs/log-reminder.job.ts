import { Inject, Injectable } from '@nestjs/common';
import { DaysService } from '../src/features/days/days.service.ts';
import { periodDays } from '../src/features/jobs/job-period.ts';
import type { JobKey } from '../src/features/jobs/jobs.types.ts';
import { PeopleService } from '../src/features/people/people.service.ts';
import { SquadsService } from '../src/features/squads/squads.service.ts';
import { Clock } from '../src/platform/clock.ts';
import type { Env } from '../src/platform/env.ts';
import { eachDespiteFailures } from '../src/platform/mail/each-despite-failures.ts';
import { MailTransport } from '../src/platform/mail/mail-transport.ts';
import { ENV } from '../src/platform/tokens.ts';
import { localDateTime, localDay } from '../src/platform/zoned-time.ts';
import { logReminderMail } from './log-reminder.mail.ts';
import type { OpenDays } from './log-reminder.mail.ts';
import type { JobHandler, JobRun } from './runner/job-handler.ts';

interface Reminder extends OpenDays {
  zone: string;
  /** Of the week: the reminder is dated its evening, at every attempt. */
  lastDay: string;
  recipients: { personId: string; name: string; email: string }[];
}

/** Tells the staff of a squad which days of the week are still open; says nothing when all are closed. */
@Injectable()
export class LogReminderJob implements JobHandler {
  readonly id = 'log-reminder';

  constructor(
    private readonly days: DaysService,
    private readonly squads: SquadsService,
    private readonly people: PeopleService,
    private readonly mail: MailTransport,
    private readonly clock: Clock,
    @Inject(ENV) private readonly env: Pick<Env, 'MAIL_FROM'>,
  ) {}

  async run(run: JobRun): Promise<string> {
    const reminder = await run.step(() => this.reminder(run));
    if (reminder.days.length === 0) return 'Every day is closed: nobody was reminded.';
    const refused: string[] = [];
    await eachDespiteFailures(reminder.recipients, async ({ personId, email }) => {
      await run.stepOnce(`mail ${personId}`, async () => {
        const { accepted } = await this.mail.send({
          messageId: this.messageId(run, personId),
          from: this.env.MAIL_FROM,
          to: [email],
          ...logReminderMail(reminder),
          attachments: [],
          date: localDateTime(reminder.lastDay, '18:00', reminder.zone),
        });
        if (!accepted) refused.push(personId);
      });
    });
    const refusals = refused.length === 0 ? '' : `, ${refused.length} refused by the mail server`;
    return `${reminder.days.length} open, ${reminder.recipients.length} reminded${refusals}.`;
  }

  async preview(run: JobKey): Promise<string[]> {
    const { days, recipients } = await this.reminder(run);
    if (days.length === 0) return ['Every day is closed: nobody would be reminded.'];
    return [
      `Not closed: ${days.join(', ')}.`,
      ...(recipients.length === 0 ? ['No staff in this squad: nobody would be reminded.'] : []),
      ...recipients.map(({ name, email }) => `to ${name} <${email}>, unless it was sent before`),
    ];
  }

  /** Days up to today on which somebody was in the squad and that are open, and the staff of the squad. */
  private async reminder({ squadId, period }: JobKey): Promise<Reminder> {
    const { name, zone } = await this.squads.squad(squadId);
    const { from, to } = periodDays('iso-week', period)!;
    const today = localDay(this.clock.now(), zone);
    const closed = new Set((await this.days.closings(squadId, from, to)).map(({ day }) => day));
    const stays = await this.squads.members(squadId, from, to);
    const peopled = (day: string) => stays.some((stay) => stay.from <= day && (stay.to === null || day <= stay.to));
    const days = daysOf(from, to).filter((day) => day <= today && !closed.has(day) && peopled(day));
    const people = await this.people.list();
    const recipients = people
      .filter(({ roles }) => roles.some((one) => one.role === 'staff' && (one.squadId ?? squadId) === squadId))
      .map(({ id, name: person, email }) => ({ personId: id, name: person, email }));
    return { squad: name, isoWeek: period, days, today, zone, lastDay: to, recipients };
  }

  private messageId({ squadId, period }: JobKey, personId: string): string {
    const domain = /@([A-Za-z0-9.-]+)/.exec(this.env.MAIL_FROM)?.[1] ?? 'loadweir.invalid';
    return `<${this.id}.${period}.${squadId}.${personId}@${domain}>`;
  }
}

function daysOf(from: string, to: string): string[] {
  const days: string[] = [];
  for (let time = Date.parse(`${from}T00:00:00Z`); time <= Date.parse(`${to}T00:00:00Z`); time += 86_400_000) {
    days.push(new Date(time).toISOString().slice(0, 10));
  }
  return days;
}
