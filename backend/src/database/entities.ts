import { AuditEntity } from '../audit/audit.entity';
import { DefrostPlanEntity } from '../defrosts/defrost-plan.entity';
import { LiveEventEntity } from '../events/live-event.entity';
import { JobEntity } from '../jobs/job.entity';
import { OpeningEntity } from '../openings/opening.entity';
import { AcceptanceEntity } from '../packages/acceptance.entity';
import { PackageEntity } from '../packages/package.entity';
import { CompanyEntity } from '../people/company.entity';
import { DeviceEntity } from '../people/device.entity';
import { MembershipEntity } from '../people/membership.entity';
import { PersonEntity } from '../people/person.entity';
import { CircuitEntity } from '../plant/circuit.entity';
import { CoilEntity } from '../plant/coil.entity';
import { FixtureEntity } from '../plant/fixture.entity';
import { SuctionGroupEntity } from '../plant/suction-group.entity';
import { SystemEntity } from '../plant/system.entity';
import { RefrigerantTableEntity } from '../refrigerants/refrigerant-table.entity';
import { ReviewEntity } from '../reviews/review.entity';
import { EntryEntity } from '../sequences/entry.entity';
import { PhotoEntity } from '../sequences/photo.entity';
import { SequenceEntity } from '../sequences/sequence.entity';
import { StepListEntity } from '../sequences/step-list.entity';
import { TemplateVersionEntity } from '../templates/template-version.entity';

/** Every entity, listed by hand: one that isn't here has no table, and a spec compares this list with the migrations. */
export const ENTITIES = [
  CompanyEntity,
  PersonEntity,
  MembershipEntity,
  DeviceEntity,
  OpeningEntity,
  SystemEntity,
  SuctionGroupEntity,
  CircuitEntity,
  FixtureEntity,
  CoilEntity,
  TemplateVersionEntity,
  RefrigerantTableEntity,
  StepListEntity,
  SequenceEntity,
  EntryEntity,
  PhotoEntity,
  ReviewEntity,
  AuditEntity,
  JobEntity,
  LiveEventEntity,
  DefrostPlanEntity,
  PackageEntity,
  AcceptanceEntity,
];
