import type { LevelWork, OpeningDetail } from '#shared/contracts/openings';
import type { LineJoint } from '../ui/copper-line/copper-line';

/** One system as its page shows it: the line, and the same in figures. */
export interface SystemLine {
  readonly id: string;
  readonly name: string;
  readonly refrigerant: string;
  readonly joints: readonly LineJoint[];
  readonly circuitIds: readonly string[];
  readonly approved: number;
  /** Circuits that a checklist applies to. */
  readonly total: number;
  /** The own work of the system and of its suction groups, each by its short name. */
  readonly work: readonly (Pick<LevelWork, 'circuitId' | 'state' | 'level'> & { readonly name: string })[];
}

/** Turns an opening's systems into copper lines, in the order of the server. */
export function systemLines(systems: OpeningDetail['systems']): readonly SystemLine[] {
  return systems.map(({ id, name, refrigerant, joints, work }) => ({
    id,
    name,
    refrigerant,
    joints: joints.map(({ code, state }) => ({ label: code, state })),
    circuitIds: joints.map(({ circuitId }) => circuitId),
    approved: joints.filter(({ state }) => state === 'approved').length,
    total: joints.filter(({ state }) => state !== 'noSequence').length,
    work: work.map(({ circuitId, state, level, code }) => ({
      circuitId,
      state,
      level,
      // A group's code begins with its system's name, which stands above already.
      name: code.startsWith(`${name} `) ? code.slice(name.length + 1) : code,
    })),
  }));
}
