import { createRequire } from 'node:module';
import path from 'node:path';
import { PROJECT_ROOT } from '../paths.mjs';
import { Browser } from './browser.mjs';

const PASSWORD = 'fifteen characters or more';
const HEADINGS =
  'System,Refrigerant,Suction group,Circuit,Fixture,Class,Description,Area,Evap temp (°F),Discharge air (°F),SH low (°F),SH high (°F),Coils,Defrost';
const INSTALLERS = 32;
const OPENINGS = 8;
const CIRCUITS_PER_OPENING = 125;

/** Circuits that the load leaves alone: one that is opened, and those that are submitted. */
const RESERVED_CIRCUITS = 24;

const require = createRequire(import.meta.url);
const compiled = (/** @type {string} */ name) =>
  require(path.join(PROJECT_ROOT, 'dist', 'backend', 'src', name));

/**
 * @typedef {object} Seeded
 * @property {import('./phones.mjs').PlannedInstaller[]} phones 32, who share 1,000 circuits between them
 * @property {import('./phones.mjs').PlannedInstaller} quiet one who works alone in an opening without load
 * @property {{ email: string, password: string }} lead of that opening
 * @property {{ email: string, password: string }} installer of that opening
 */

/**
 * Fills the product through its own services, which write in sets: a company, eight openings of 125 circuits
 * with four installers each, and one opening that the load doesn't touch.
 * @param {import('./stage.mjs').Stage} stage
 * @param {(line: string) => void} log
 * @returns {Promise<Seeded>}
 */
export async function seed(stage, log) {
  // The server says it in its log already.
  process.env.AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED = 'true';
  const { pino } = require('pino');
  const config = compiled('app/config.js').readConfig(stage.environment);
  const dataSource = compiled('database/data-source.js').createDataSource(config.appAccount, 4);
  await dataSource.initialize();
  const services = compiled('app/services.js').wireServices(config, dataSource, pino({ level: 'silent' }));
  try {
    return await new Seeder(services, stage.port, log).run();
  } finally {
    await services.close();
    await dataSource.destroy();
  }
}

class Seeder {
  /**
   * @param {any} services the product's, as its composition root wires them
   * @param {number} port
   * @param {(line: string) => void} log
   */
  constructor(services, port, log) {
    this.services = services;
    this.port = port;
    this.log = log;
    this.random = compiled('demo/steady-numbers.js').steadyNumbers(7);
  }

  /** @returns {Promise<Seeded>} */
  async run() {
    const browser = new Browser(this.port);
    await browser.get('/api/session');
    this.forgeryToken = browser.forgeryToken;
    browser.close();
    this.companyId = await this.services.register.addCompany('Bench Refrigeration');
    const admin = await this.#addPerson('admin', 'admin');
    this.admin = await this.services.register.find(admin.id);
    const lead = await this.#addPerson('lead', 'lead');
    const phones = [];
    for (let opening = 0; opening < OPENINGS; opening += 1) {
      phones.push(
        ...(await this.#fillOpening(`Store ${opening}`, CIRCUITS_PER_OPENING, INSTALLERS / OPENINGS, lead))
          .planned,
      );
    }
    const { planned, people } = await this.#fillOpening('Quiet store', RESERVED_CIRCUITS, 1, lead);
    const signIn = ({ email }) => ({ email, password: PASSWORD });
    return { phones, quiet: planned[0], lead: signIn(lead), installer: signIn(people[0]) };
  }

  /**
   * @param {string} name
   * @param {number} circuits
   * @param {number} installers
   * @param {{ id: string }} lead
   */
  async #fillOpening(name, circuits, installers, lead) {
    const { register, openings, schedules } = this.services;
    const opening = await openings.create(this.admin, {
      name,
      address: '1 Main Street',
      elevationM: 200,
      openingDate: new Date(Date.now() + 30 * 86_400_000).toISOString().slice(0, 10),
      timeZone: 'America/Chicago',
      contractorName: 'Builder',
      unitSystem: 'us',
      language: 'en',
    });
    await register.addMember(opening.id, this.companyId, lead.id, 'lead');
    const people = [];
    for (let index = 0; index < installers; index += 1) {
      const person = await this.#addPerson(
        `${name.toLowerCase().replaceAll(' ', '-')}-${index}`,
        'installer',
      );
      await register.addMember(opening.id, this.companyId, person.id, 'installer');
      people.push(person);
    }
    await schedules.import(await register.find(lead.id), opening.id, scheduleOf(circuits), true);
    const { items } = await openings.listCircuits(opening.id, 200, undefined);
    const planned = [];
    for (const [index, person] of people.entries()) {
      const own = items.filter((_, at) => at % installers === index);
      await openings.assign(
        this.admin,
        opening.id,
        own.map((row) => row.circuitId),
        person.id,
      );
      planned.push(await this.#plan(person, own));
    }
    this.log(`  ${name}: ${items.length} circuits, ${planned[0].sequences[0].contents.length} steps each`);
    return { planned, people };
  }

  /**
   * @param {{ id: string, name: string }} person
   * @param {readonly { sequenceId: string }[]} circuits
   * @returns {Promise<import('./phones.mjs').PlannedInstaller>}
   */
  async #plan(person, circuits) {
    const known = await this.services.register.find(person.id);
    const devices = [];
    for (const label of ['single', 'batch']) {
      const { response, credential } = await this.services.sessions.registerDevice(known, null, label);
      const cookie = `XSRF-TOKEN=${this.forgeryToken}; firstcold_device=${encodeURIComponent(credential)}`;
      devices.push({ deviceId: response.deviceId, cookie });
    }
    const sequences = [];
    for (const { sequenceId } of circuits) {
      sequences.push(await this.#planSequence(sequenceId, person));
    }
    return { authorId: person.id, devices, forgeryToken: this.forgeryToken ?? '', sequences };
  }

  /**
   * @param {string} id
   * @param {{ name: string }} author
   */
  async #planSequence(id, author) {
    const { judge } = require('#shared/checklist/judge');
    const { demoAnswer } = compiled('demo/demo-answer.js');
    const { stepList, stepListHash, specification } = await this.services.sequences.show(id);
    const { facts } = stepList;
    const scene = {
      specification,
      facts,
      author: author.name,
      random: this.random,
      photo: () => this.#photo(),
    };
    const contents = [];
    for (const step of stepList.steps) {
      const answer = plausible(await demoAnswer(step, scene));
      const { outcome, counts, figures } = judge(step, answer, facts);
      contents.push({ kind: 'answer', stepKey: step.key, answer, workedOut: { outcome, counts, figures } });
    }
    return { id, stepListHash, contents };
  }

  /** Named but never sent: entries don't wait for their photos. */
  async #photo() {
    const sha256 = Array.from({ length: 64 }, () => Math.floor(this.random() * 16).toString(16)).join('');
    return { sha256, originalSha256: null, bytes: 180_000, width: 2048, height: 1536, capturedAt: null };
  }

  /**
   * @param {string} key
   * @param {string} companyRole
   */
  async #addPerson(key, companyRole) {
    const email = `${key}@bench.example`;
    const name = `Person ${key}`;
    const { companyId } = this;
    const fields = { companyId, name, email, password: PASSWORD, companyRole, language: 'en' };
    return { id: await this.services.register.addPerson(fields), email, name };
  }
}

/**
 * A share of less than nothing, which the demo's scatter can make of a limit, would not count as an answer.
 * @param {any} answer
 */
function plausible(answer) {
  const isImpossible =
    answer.kind === 'reading' && answer.value.unit === 'percent' && Number(answer.value.text) < 0;
  return isImpossible ? { ...answer, value: { ...answer.value, text: '45' } } : answer;
}

/** @param {number} circuits of two cases each */
function scheduleOf(circuits) {
  const rows = [HEADINGS];
  for (let number = 1; number <= circuits; number += 1) {
    for (const fixture of [1, 2]) {
      rows.push(
        `Rack A,R-448A,AS-1,A${number},A${number}-${fixture},medium,Dairy multideck,Dairy,22,30,6,8,1,off-time`,
      );
    }
  }
  return Buffer.from(rows.join('\n'));
}
