import type { Signature } from '#shared/checklist/signature';
import type { FoldEntry } from '#shared/sequences/fold';
import { signatureBox } from '../../pdf/signature-box';
import type { Block } from '../../pdf/block';
import { arrivedLater, authorOf, type CircuitContext } from './judged-entry';

/**
 * A signature with its printed name, in what capacity it was given, when, and what it means. One that was made without a
 * network shows both times.
 */
export function signedBlock(
  circuit: CircuitContext,
  entry: FoldEntry,
  signature: Signature,
  said: { readonly capacity: string; readonly meaning: string },
): Block {
  const { sheet, words, format } = circuit.context;
  const account = authorOf(circuit, entry);
  const received = arrivedLater(circuit, entry);
  const when = format.dateTime(entry.body.deviceTime);
  const lines = [
    signature.printedName,
    said.capacity,
    ...(account === signature.printedName ? [] : [words.signature.account(account)]),
    received === null ? when : words.signature.when(when),
    ...(received === null ? [] : [words.signature.receivedWhen(format.dateTime(received))]),
    ...(said.meaning === '' ? [] : [words.signature.meaning(said.meaning)]),
    ...(signature.typed ? [words.signature.typed] : []),
  ];
  return signatureBox(sheet, signature, lines, words.signature.alt(signature.printedName));
}
