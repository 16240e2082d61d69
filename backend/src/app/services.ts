import { join } from 'node:path';
import { createPool, type Pool } from 'mysql2';
import type { Logger } from 'pino';
import type { DataSource } from 'typeorm';
import { AuditRepository } from '../audit/audit.repository';
import { AuditService } from '../audit/audit.service';
import { Transactions } from '../database/transactions';
import { DefrostPlansRepository } from '../defrosts/defrost-plans.repository';
import { DefrostPlansService } from '../defrosts/defrost-plans.service';
import { LiveEventsRepository } from '../events/live-events.repository';
import { LiveEventsService } from '../events/live-events.service';
import { ObjectStorage } from '../files/object-storage';
import { PhotoRenderer } from '../files/photo-renderer';
import { HealthService } from '../health/health.service';
import { JobWorker, type JobHandlers } from '../jobs/job-worker';
import { JobsRepository } from '../jobs/jobs.repository';
import { JobsService } from '../jobs/jobs.service';
import { Mailer } from '../mail/mailer';
import { CircuitListRepository } from '../openings/circuit-list.repository';
import { OpeningsRepository } from '../openings/openings.repository';
import { OpeningsService } from '../openings/openings.service';
import { PackageBuilder } from '../packages/package-builder.service';
import { PackagesRepository } from '../packages/packages.repository';
import { PackagesService } from '../packages/packages.service';
import { PeopleAccessDesk } from '../people/access-desk';
import { DevicesRepository } from '../people/devices.repository';
import { PeopleRepository } from '../people/people.repository';
import { PeopleRegister } from '../people/people-register.service';
import { PeopleService } from '../people/people.service';
import { SessionDoor } from '../people/session-door';
import { SessionService } from '../people/session.service';
import { SignInLimit } from '../people/sign-in-limit';
import { SubjectsRepository } from '../people/subjects.repository';
import { PlantRepository } from '../plant/plant.repository';
import { PlantService } from '../plant/plant.service';
import { RefrigerantsRepository } from '../refrigerants/refrigerants.repository';
import { RefrigerantsService } from '../refrigerants/refrigerants.service';
import { ReviewQueueRepository } from '../reviews/review-queue.repository';
import { ReviewQueueService } from '../reviews/review-queue.service';
import { ReviewsRepository } from '../reviews/reviews.repository';
import { ReviewsService } from '../reviews/reviews.service';
import { SentBackExpansion } from '../reviews/sent-back-expansion.service';
import { SentBackNotice } from '../reviews/sent-back-notice.service';
import { SchedulesService } from '../schedules/schedules.service';
import { EntriesService } from '../sequences/entries.service';
import { FloodHuntRepository } from '../sequences/flood-hunt.repository';
import { FloodHuntService } from '../sequences/flood-hunt.service';
import { ExpansionService } from '../sequences/expansion.service';
import { PhotosRepository } from '../sequences/photos.repository';
import { PhotosService } from '../sequences/photos.service';
import { SequenceReviewDesk } from '../sequences/sequence-review-desk.service';
import { SequencesRepository } from '../sequences/sequences.repository';
import { SequencesService } from '../sequences/sequences.service';
import { StepLists } from '../sequences/step-lists';
import { InstallationKey } from '../signing/installation-key';
import { TemplatesRepository } from '../templates/templates.repository';
import { TemplatesService } from '../templates/templates.service';
import { ForgeryGuard } from '../http/csrf';
import { sessionMiddleware } from '../http/session';
import type { Config } from './config';
import { PROJECT_FOLDER } from './project-folder';

export type Services = ReturnType<typeof wireServices>;

/** A callback pool: the session store and the rate limiter share it (the limiter refuses a promise pool). */
function corePool(config: Config): Pool {
  return createPool({
    host: config.appAccount.host,
    port: config.appAccount.port,
    database: config.appAccount.database,
    user: config.appAccount.user,
    password: config.appAccount.password,
    connectionLimit: 8,
    timezone: 'Z',
    connectTimeout: 5_000,
  });
}

/** Everything that knows everything: each part is made once, from what it needs, in the order of the arrows. */
export function wireServices(config: Config, dataSource: DataSource, logger: Logger) {
  const pool = corePool(config);
  const transactions = new Transactions(dataSource);
  const key = InstallationKey.load(config.SIGNING_KEY_FILE);
  const storage = new ObjectStorage(config.storage);
  const renderer = new PhotoRenderer(
    join(PROJECT_FOLDER, 'dist', 'backend', 'src', 'files', 'photo-worker.js'),
  );
  const mailer = new Mailer(config.mail);
  const audit = new AuditService(new AuditRepository());
  const events = new LiveEventsService(transactions, new LiveEventsRepository(), logger);
  const jobsRepository = new JobsRepository();
  const jobs = new JobsService(transactions, jobsRepository);

  const peopleRepository = new PeopleRepository();
  const devices = new DevicesRepository();
  const people = new PeopleService(transactions, peopleRepository, devices);
  const signInLimit = new SignInLimit(pool, config.appAccount.database);
  const sessions = new SessionService(transactions, peopleRepository, devices, audit, signInLimit);
  const session = sessionMiddleware(pool, config.SESSION_SECRET, config.secure);
  const desk = new PeopleAccessDesk(
    transactions,
    peopleRepository,
    devices,
    new SubjectsRepository(),
    session.handle,
  );
  const door = new SessionDoor(sessions, desk, session.handle, config.secure);

  const plant = new PlantService(new PlantRepository());
  const openings = new OpeningsService(
    transactions,
    new OpeningsRepository(),
    new CircuitListRepository(),
    plant,
    people,
    audit,
    events,
  );
  const refrigerants = new RefrigerantsService(transactions, new RefrigerantsRepository(), people, audit);
  const templates = new TemplatesService(
    new TemplatesRepository(),
    refrigerants,
    join(PROJECT_FOLDER, 'templates'),
  );
  const register = new PeopleRegister(transactions, peopleRepository, templates);

  const sequencesRepository = new SequencesRepository();
  const photosRepository = new PhotosRepository();
  const stepLists = new StepLists(sequencesRepository);
  const expansion = new ExpansionService(templates, sequencesRepository, stepLists, events);
  const schedules = new SchedulesService(
    transactions,
    openings,
    plant,
    refrigerants,
    expansion,
    audit,
    events,
  );
  const entries = new EntriesService(transactions, sequencesRepository, stepLists, people, events);
  const sequences = new SequencesService(
    transactions,
    sequencesRepository,
    photosRepository,
    stepLists,
    openings,
    people,
  );
  const floodHunt = new FloodHuntService(
    transactions,
    new FloodHuntRepository(),
    sequencesRepository,
    stepLists,
  );
  const photos = new PhotosService(
    transactions,
    sequencesRepository,
    photosRepository,
    people,
    storage,
    renderer,
    jobs,
    events,
  );

  const reviewDesk = new SequenceReviewDesk(sequencesRepository, stepLists, photosRepository);
  const notice = new SentBackNotice(reviewDesk, openings, plant, people, jobs, config.publicUrl);
  const reviews = new ReviewsService(
    transactions,
    reviewDesk,
    new ReviewsRepository(),
    key,
    audit,
    events,
    notice,
    new SentBackExpansion(openings, plant, expansion),
  );
  const queue = new ReviewQueueService(transactions, new ReviewQueueRepository(), openings);

  const defrosts = new DefrostPlansService(
    transactions,
    new DefrostPlansRepository(),
    openings,
    plant,
    audit,
  );

  const packagesRepository = new PackagesRepository();
  const packages = new PackagesService(
    transactions,
    packagesRepository,
    openings,
    defrosts,
    storage,
    jobs,
    key,
    audit,
    events,
  );
  const builder = new PackageBuilder(
    transactions,
    packagesRepository,
    openings,
    defrosts,
    people,
    sequences,
    photos,
    storage,
    jobs,
    key,
    events,
    { temporaryFolder: join(config.DATA_DIR, 'temporary'), publicUrl: config.publicUrl },
  );

  const handlers: JobHandlers = {
    mail: (payload, run) => mailer.send(payload, run),
    photoCheck: (payload, run) => photos.check(payload, run),
    package: (payload, run) => builder.build(payload, run),
  };
  const worker = new JobWorker(transactions, jobsRepository, handlers, logger, {
    package: (payload) => builder.abandon(payload),
  });
  jobs.onEnqueued(() => worker.nudge());

  const health = new HealthService({
    database: () => dataSource.query('SELECT 1'),
    files: () => storage.ping(),
    mail: () => mailer.ping(),
  });
  return {
    transactions,
    key,
    storage,
    events,
    jobs,
    people,
    register,
    sessions,
    desk,
    door,
    openings,
    plant,
    refrigerants,
    templates,
    schedules,
    entries,
    sequences,
    floodHunt,
    photos,
    reviews,
    queue,
    defrosts,
    packages,
    health,
    worker,
    forgery: new ForgeryGuard(config.SESSION_SECRET, config.secure),
    sweep: async (): Promise<void> => {
      await new LiveEventsRepository().sweep(transactions.outside);
      await jobsRepository.sweep(transactions.outside);
      await signInLimit.sweep(transactions.outside);
    },
    close: async (): Promise<void> => {
      events.close();
      await worker.stop();
      await renderer.close();
      storage.close();
      await session.close();
      await new Promise<void>((resolve) => pool.end(() => resolve()));
    },
  };
}
