import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Role } from '#shared/access/roles';
import type { CircuitRow } from '#shared/contracts/openings';
import type { CompanyId, OpeningId, PersonId, SequenceId } from '#shared/plant/ids';
import { PROJECT_FOLDER } from '../app/project-folder';
import { PASSWORD, TestClient } from './test-client';
import type { TestServer } from './test-server';

export interface TestPerson {
  readonly id: PersonId;
  readonly email: string;
}

/** A company with one opening and one person of each role in it. */
export interface TestStore {
  readonly companyId: CompanyId;
  readonly openingId: OpeningId;
  readonly people: Readonly<Record<'admin' | 'lead' | 'lead2' | 'installer' | 'contractor', TestPerson>>;
  client(role: keyof TestStore['people']): Promise<TestClient>;
}

const HEADINGS =
  'System,Refrigerant,Suction group,Circuit,Fixture,Class,Description,Area,Evap temp (°F),Discharge air (°F),SH low (°F),SH high (°F),Coils,Defrost';

/** A schedule of two circuits with three coils between them. */
export const SMALL_SCHEDULE = Buffer.from(
  [
    HEADINGS,
    'Rack A,R-448A,AS-1,A1,A1-1,medium,Dairy multideck,Dairy,22,30,6,8,1,off-time',
    'Rack A,R-448A,AS-1,A1,A1-2,medium,Dairy multideck,Dairy,22,30,6,8,1,off-time',
    'Rack A,R-448A,AS-1,A2,A2-1,medium,Deli case,Deli,20,29,6,8,1,off-time',
  ].join('\n'),
);

export function harborStreetSchedule(): Buffer {
  return readFileSync(join(PROJECT_FOLDER, 'backend', 'demo', 'harbor-street-schedule.csv'));
}

/** Enters a company, its people and an opening, through the services. */
export async function makeStore(server: TestServer, name: string): Promise<TestStore> {
  const { register, openings } = server.services;
  const companyId = await register.addCompany(name);
  const roles: Record<keyof TestStore['people'], Role> = {
    admin: 'admin',
    lead: 'lead',
    lead2: 'lead',
    installer: 'installer',
    contractor: 'contractor',
  };
  const people = {} as Record<keyof TestStore['people'], TestPerson>;
  for (const key of Object.keys(roles) as (keyof TestStore['people'])[]) {
    const email = `${key}@${name}.example`;
    const id = await register.addPerson({
      companyId,
      name: `${key} of ${name}`,
      email,
      password: PASSWORD,
      companyRole: roles[key],
      language: 'en',
    });
    people[key] = { id, email };
  }
  const opening = await openings.create(await register.find(people.admin.id), {
    name: `Store of ${name}`,
    address: '1 Main Street',
    elevationM: 0,
    openingDate: '2027-02-01',
    timeZone: 'America/Chicago',
    contractorName: 'Builder',
    unitSystem: 'us',
    language: 'en',
  });
  for (const key of ['lead', 'lead2', 'installer', 'contractor'] as const) {
    await register.addMember(opening.id, companyId, people[key].id, roles[key]);
  }
  return {
    companyId,
    openingId: opening.id,
    people,
    async client(role) {
      const client = new TestClient(server);
      await client.signIn(people[role].email);
      if (role === 'installer') await client.registerDevice();
      return client;
    },
  };
}

/** Imports the small schedule; the sequences by circuit code, and those of its system and group by their names. */
export async function importSmallSchedule(
  server: TestServer,
  store: TestStore,
): Promise<Map<string, SequenceId>> {
  const lead = await server.services.register.find(store.people.lead.id);
  await server.services.schedules.import(lead, store.openingId, SMALL_SCHEDULE, true);
  const { items } = await server.services.openings.listCircuits(store.openingId, 200, undefined);
  return new Map(items.map((row: CircuitRow) => [row.code, row.sequenceId as SequenceId]));
}
