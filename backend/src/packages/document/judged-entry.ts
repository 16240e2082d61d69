import type { Judgement } from '#shared/checklist/judgement';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { FoldEntry } from '#shared/sequences/fold';
import type { DocumentContext } from './document-context';

/** What the server made of an answer; where it judged nothing, what the device had worked out. `null` for other entries. */
export function judgedOf(entry: FoldEntry): Judgement | null {
  const { content } = entry.body;
  if (content.kind !== 'answer') return null;
  if (entry.server.judgement) return entry.server.judgement;
  return { ...content.workedOut, side: null, doubts: [], limit: null, working: [] };
}

/** The entries and the people of the circuit whose chapter is being drawn. */
export interface CircuitContext {
  readonly context: DocumentContext;
  readonly detail: SequenceDetail;
  readonly names: ReadonlyMap<string, string>;
  /** When each entry reached the server. */
  readonly receivedAt: ReadonlyMap<string, string>;
}

export function circuitContext(context: DocumentContext, detail: SequenceDetail): CircuitContext {
  return {
    context,
    detail,
    names: new Map(detail.people.map((person) => [person.id, person.name])),
    receivedAt: new Map(detail.entries.map((entry) => [entry.body.id, entry.server.receivedAt])),
  };
}

export function authorOf(circuit: CircuitContext, entry: FoldEntry): string {
  return circuit.names.get(entry.body.authorId) ?? circuit.context.words.unknownPerson;
}

/** Ten minutes: what arrives within them was recorded with a network. */
const LATE_ARRIVAL_MS = 600_000;

/** Whether an entry waited on the device for a network, or its clock is off: then both times are worth printing. */
export function arrivedLater(circuit: CircuitContext, entry: FoldEntry): string | null {
  const received = circuit.receivedAt.get(entry.body.id);
  if (received === undefined) return null;
  const apart = Math.abs(new Date(received).getTime() - new Date(entry.body.deviceTime).getTime());
  return apart > LATE_ARRIVAL_MS ? received : null;
}

/** Who recorded an entry and when, as one line. */
export function whoAndWhen(circuit: CircuitContext, entry: FoldEntry): string {
  const { words, format } = circuit.context;
  const line = words.recordedBy(authorOf(circuit, entry), format.dateTime(entry.body.deviceTime));
  const received = arrivedLater(circuit, entry);
  return received === null ? line : `${line}; ${words.received(format.dateTime(received))}`;
}
