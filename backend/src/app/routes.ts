import { saveDefrostPlan } from '../defrosts/routes/save-defrost-plan.route';
import { showDefrostPlan } from '../defrosts/routes/show-defrost-plan.route';
import { listen } from '../events/routes/listen.route';
import { showHealth } from '../health/routes/show-health.route';
import type { AnyRoute } from '../http/define-route';
import { listJobs } from '../jobs/routes/list-jobs.route';
import { assignCircuits } from '../openings/routes/assign-circuits.route';
import { createOpening } from '../openings/routes/create-opening.route';
import { listCircuits } from '../openings/routes/list-circuits.route';
import { listMyCircuits } from '../openings/routes/list-my-circuits.route';
import { listOpenings } from '../openings/routes/list-openings.route';
import { showOpening } from '../openings/routes/show-opening.route';
import { acceptPackage } from '../packages/routes/accept-package.route';
import { cancelPackage } from '../packages/routes/cancel-package.route';
import { listPackages } from '../packages/routes/list-packages.route';
import { readPackage } from '../packages/routes/read-package.route';
import { requestPackage } from '../packages/routes/request-package.route';
import { showPackage } from '../packages/routes/show-package.route';
import { givePasswordAgain } from '../people/routes/give-password-again.route';
import { listPeople } from '../people/routes/list-people.route';
import { registerDevice } from '../people/routes/register-device.route';
import { setLanguage } from '../people/routes/set-language.route';
import { showSession } from '../people/routes/show-session.route';
import { signIn } from '../people/routes/sign-in.route';
import { signOut } from '../people/routes/sign-out.route';
import { addRefrigerantTable } from '../refrigerants/routes/add-refrigerant-table.route';
import { listRefrigerantTables } from '../refrigerants/routes/list-refrigerant-tables.route';
import { giveReview } from '../reviews/routes/give-review.route';
import { listReviewQueue } from '../reviews/routes/list-review-queue.route';
import { importSchedule } from '../schedules/routes/import-schedule.route';
import { addPhoto } from '../sequences/routes/add-photo.route';
import { appendEntries } from '../sequences/routes/append-entries.route';
import { showFloodHunt } from '../sequences/routes/show-flood-hunt.route';
import { showPhoto } from '../sequences/routes/show-photo.route';
import { showSequence } from '../sequences/routes/show-sequence.route';
import { showInstallationKey } from '../signing/routes/show-installation-key.route';
import type { Services } from './services';

/** Every endpoint there is. A route that isn't here doesn't exist, and a spec finds a route file that was forgotten. */
export function listRoutes(services: Services): readonly AnyRoute[] {
  return [
    showHealth(services.health),
    showInstallationKey(services.key),
    signIn(services.door),
    showSession(services.door),
    signOut(services.door),
    givePasswordAgain(services.door, services.sessions),
    setLanguage(services.sessions),
    registerDevice(services.door),
    listen(services.events),
    listJobs(services.jobs),
    listOpenings(services.openings),
    createOpening(services.openings),
    showOpening(services.openings),
    listPeople(services.people),
    listCircuits(services.openings),
    assignCircuits(services.openings),
    importSchedule(services.schedules),
    listMyCircuits(services.openings),
    showSequence(services.sequences),
    showFloodHunt(services.floodHunt),
    appendEntries(services.entries),
    addPhoto(services.photos),
    showPhoto(services.photos, services.sequences),
    listReviewQueue(services.queue),
    giveReview(services.reviews),
    showDefrostPlan(services.defrosts),
    saveDefrostPlan(services.defrosts),
    listRefrigerantTables(services.refrigerants),
    addRefrigerantTable(services.refrigerants),
    listPackages(services.packages),
    requestPackage(services.packages),
    showPackage(services.packages),
    cancelPackage(services.packages),
    readPackage(services.packages),
    acceptPackage(services.packages),
  ];
}
