import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Logger } from 'pino';
import type { Role } from '#shared/access/roles';
import type { CircuitRow, NewOpening } from '#shared/contracts/openings';
import type { CompanyId, OpeningId, PersonId, SequenceId } from '#shared/plant/ids';
import type { Level } from '#shared/plant/words';
import { PROJECT_FOLDER } from '../app/project-folder';
import type { Services } from '../app/services';
import type { Caller } from '../http/define-route';
import { saveDemoDefrostPlan } from './demo-defrost-plan';
import { DemoInstaller, type DemoWork } from './demo-installer';
import { demoSignature } from './demo-answer';
import { steadyNumbers } from './steady-numbers';

interface DemoAccount {
  readonly role: Role;
  readonly name: string;
  readonly email: string;
  readonly password: string;
}

const DAY_MS = 86_400_000;

/** How far the first suction group's own work has come, before the circuits that hang on it. */
const GROUP_STORY: DemoWork = { share: 0.6, submit: false };

/** What happens to the first circuits of the demo opening, in the order of its schedule. */
const STORY: readonly (DemoWork & { readonly verdict?: 'approved' | 'sentBack' })[] = [
  { share: 1, submit: true, verdict: 'approved' },
  { share: 1, submit: true, verdict: 'approved' },
  { share: 1, submit: true, verdict: 'sentBack', superheatExcessK: 2.4 },
  { share: 1, submit: true },
  { share: 1, submit: true, superheatExcessK: 3.1 },
  { share: 0.55, submit: false },
  { share: 0.2, submit: false },
];

/** Fills an empty database with an invented company, two openings and some days of work. Does nothing otherwise. */
export async function seedDemo(services: Services, logger: Logger): Promise<void> {
  if (!(await services.register.isEmpty())) return;
  const file = join(PROJECT_FOLDER, 'backend', 'scripts', 'demo-accounts.json');
  const accounts = JSON.parse(readFileSync(file, 'utf8')) as DemoAccount[];
  const own = await services.register.addCompany('Northgate Refrigeration');
  const builder = await services.register.addCompany('Ridgeline Builders');
  const people = await addPeople(services, accounts, own, builder);
  const admin = await callerOf(services, people.first('admin'));
  const harbor = await addOpening(
    services,
    admin,
    openingOf('Harbor Street Market', '410 Harbor Street, Tillamere', 26),
    people,
  );
  await addOpening(services, admin, openingOf('Mill Road Market', '88 Mill Road, Eastwick', 61), people);
  const lead = await callerOf(services, people.first('lead'));
  await importSchedule(services, lead, harbor);
  await saveDemoDefrostPlan(services, lead, harbor);
  await tellStory(services, harbor, people);
  logger.info('demo opening filled in');
}

interface DemoPeople {
  readonly all: readonly {
    readonly account: DemoAccount;
    readonly id: PersonId;
    readonly companyId: CompanyId;
  }[];
  first(role: Role): PersonId;
}

async function addPeople(
  services: Services,
  accounts: readonly DemoAccount[],
  own: CompanyId,
  builder: CompanyId,
): Promise<DemoPeople> {
  const all: { account: DemoAccount; id: PersonId; companyId: CompanyId }[] = [];
  for (const account of accounts) {
    const companyId = account.role === 'contractor' ? builder : own;
    const { name, email, password, role } = account;
    const id = await services.register.addPerson({
      companyId,
      name,
      email,
      password,
      companyRole: role,
      language: 'en',
    });
    all.push({ account, id, companyId });
  }
  return { all, first: (role) => all.find((person) => person.account.role === role)?.id as PersonId };
}

function openingOf(name: string, address: string, days: number): NewOpening {
  return {
    name,
    address,
    elevationM: 1609,
    openingDate: new Date(Date.now() + days * DAY_MS).toISOString().slice(0, 10),
    timeZone: 'America/Denver',
    contractorName: 'Ridgeline Builders',
    unitSystem: 'us',
    language: 'en',
  };
}

async function addOpening(
  services: Services,
  admin: Caller,
  opening: NewOpening,
  people: DemoPeople,
): Promise<OpeningId> {
  const { id } = await services.openings.create(admin.person, opening);
  for (const { account, id: personId } of people.all) {
    if (account.role !== 'admin')
      await services.register.addMember(id, admin.person.companyId, personId, account.role);
  }
  return id;
}

async function importSchedule(services: Services, lead: Caller, openingId: OpeningId): Promise<void> {
  const file = join(PROJECT_FOLDER, 'backend', 'demo', 'harbor-street-schedule.csv');
  await services.schedules.import(lead.person, openingId, readFileSync(file), true);
}

async function tellStory(services: Services, openingId: OpeningId, people: DemoPeople): Promise<void> {
  const lead = await callerOf(services, people.first('lead'));
  const installer = await callerOf(services, people.first('installer'));
  const { items } = await services.openings.listCircuits(openingId, 200, undefined);
  const worked = items.filter((row) => row.sequenceId !== null);
  const circuits = worked.filter((row) => row.level === 'circuit').slice(0, 16);
  const first = (level: Level) => worked.find((row) => row.level === level) as CircuitRow;
  const group = first('suctionGroup');
  const mine = [first('system'), group, ...circuits];
  await services.openings.assign(
    lead.person,
    openingId,
    mine.map((row) => row.circuitId),
    installer.person.id,
  );
  const random = steadyNumbers(2026);
  const phone = await DemoInstaller.begin(services, installer, random, new Date(Date.now() - 2 * DAY_MS));
  await phone.work(group.sequenceId as SequenceId, GROUP_STORY);
  for (const [index, chapter] of STORY.entries()) {
    const row = circuits[index] as CircuitRow;
    const sequenceId = row.sequenceId as SequenceId;
    await phone.work(sequenceId, chapter);
    if (chapter.verdict) await giveVerdict(services, lead, sequenceId, chapter.verdict, random);
  }
}

async function giveVerdict(
  services: Services,
  lead: Caller,
  sequenceId: SequenceId,
  verdict: 'approved' | 'sentBack',
  random: () => number,
): Promise<void> {
  const { fold } = await services.sequences.show(sequenceId);
  const outside = Object.entries(fold.steps).find(([, step]) => step.outcome === 'outside');
  if (verdict === 'sentBack' && outside) {
    const remarks = [
      {
        stepKey: outside[0],
        text: 'Above the band on this coil. Open the valve a little, wait, and read again.',
      },
    ];
    await services.reviews.give(lead, sequenceId, { verdict, headHash: fold.headHash, remarks });
  } else {
    const signature = demoSignature(lead.personName, random);
    await services.reviews.give(lead, sequenceId, {
      verdict: 'approved',
      headHash: fold.headHash,
      signature,
    });
  }
}

async function callerOf(services: Services, id: PersonId): Promise<Caller> {
  const person = await services.register.find(id);
  return { person, personName: person.name, via: 'session', deviceId: null, passwordGivenAt: new Date() };
}
