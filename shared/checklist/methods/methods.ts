import { electronicValveMethod } from './electronic-valve';
import { evacuationMethod } from './evacuation';
import { heaterCurrentMethod } from './heater-current';
import type { Method } from './method';
import type { MethodKey } from './method-keys';
import { pressureTestMethod } from './pressure-test';
import { refrigerantChargeMethod } from './refrigerant-charge';
import { regulatorPressureMethod } from './regulator-pressure';
import { returnGasMethod } from './return-gas';
import { subcoolingMethod } from './subcooling';
import { supplyVoltageMethod } from './supply-voltage';
import { witnessedDefrostMethod } from './witnessed-defrost';

/** Every method by its key. A new key doesn't compile until its file stands here. */
export const METHODS: Readonly<Record<MethodKey, Method>> = {
  pressureTest: pressureTestMethod,
  evacuation: evacuationMethod,
  supplyVoltage: supplyVoltageMethod,
  heaterCurrent: heaterCurrentMethod,
  returnGas: returnGasMethod,
  subcooling: subcoolingMethod,
  regulatorPressure: regulatorPressureMethod,
  witnessedDefrost: witnessedDefrostMethod,
  refrigerantCharge: refrigerantChargeMethod,
  electronicValve: electronicValveMethod,
};
