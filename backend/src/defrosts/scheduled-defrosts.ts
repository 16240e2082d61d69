import type { ScheduledDefrost } from '#shared/contracts/defrost-plans';
import type { CircuitSpecification } from '#shared/plant/plant';

/**
 * An opening's circuits as far as a defrost plan asks. The work of a whole system or suction group stands among the
 * specifications too, and is no circuit.
 *
 * @param specifications in the order of the schedule
 */
export function scheduledDefrosts(specifications: readonly CircuitSpecification[]): ScheduledDefrost[] {
  return specifications.flatMap(({ level = 'circuit', system, suctionGroup, circuit }) => {
    if (level !== 'circuit' || suctionGroup === null) return [];
    const { defrost } = circuit;
    return [
      {
        id: circuit.id,
        code: circuit.code,
        description: circuit.description,
        systemName: system.name,
        groupId: suctionGroup.id,
        groupName: suctionGroup.name,
        type: defrost.type,
        perDay: defrost.perDay,
        failSafeS: defrost.failSafeS,
        dripS: defrost.dripS,
        loadW: circuit.loadW,
        walkIns: circuit.fixtures
          .filter(({ kind }) => kind === 'walkIn')
          .map(({ description }) => description),
      },
    ];
  });
}
